"""The same chain as an engineer would write it today with NumPy and SciPy: the yardstick of `npm run bench`.

Three implants with two anneals on 600 fixed depths, doping given: carriers neutral or by Poisson's equation, Klaassen mobility
(Solid-State Electron. 35, 953, 1992), layers between sign changes, sheet resistance by the trapezoid rule.
Prints the medians of the repeated runs in milliseconds, as JSON.
"""

import json
import sys
import time

import numpy as np
from scipy.linalg import solve_banded
from scipy.special import erf

Q = 1.602176634e-19
K = 8.617333262e-5
T = 298.15


def diffused_gaussian(x, dose, mean, sigma, dt):
    """A Gaussian implant cut at the surface, after diffusion behind a sealed surface."""
    s2 = sigma**2 + 2 * dt
    r = sigma * np.sqrt(2 * dt)
    s = np.sqrt(s2)
    front = dose / (2 * np.sqrt(2 * np.pi) * s)
    direct = np.exp(-((x - mean) ** 2) / (2 * s2)) * (1 + erf((2 * dt * mean + sigma**2 * x) / (np.sqrt(2) * r * s)))
    image = np.exp(-((x + mean) ** 2) / (2 * s2)) * (1 + erf((2 * dt * mean - sigma**2 * x) / (np.sqrt(2) * r * s)))
    return front * (direct + image)


def klaassen(nd, na, n, p, electron):
    """Mobility of electrons in phosphorus-doped or holes in boron-doped silicon."""
    mu_max, mu_min, n_ref, alpha, theta = (1414, 68.5, 9.2e16, 0.711, 2.285) if electron else (470.5, 44.9, 2.23e17, 0.719, 2.247)
    m_own, m_other = (1.0, 1.258) if electron else (1.258, 1.0)
    t = T / 300
    nd = nd * (1 + 1 / (0.21 + (4.0e20 / np.maximum(nd, 1)) ** 2))
    na = na * (1 + 1 / (0.50 + (7.2e20 / np.maximum(na, 1)) ** 2))
    other = p if electron else n
    nsc = nd + na + other
    c = n + p
    pp = t**2 / (2.459 / (3.97e13 * nsc ** (-2 / 3)) + 3.828 / (1.36e20 / c * m_own))
    g = 1 - 0.89233 / (0.41372 + pp * (t / m_own) ** 0.28227) ** 0.19778 + 0.005978 / (pp * (m_own / t) ** 0.72169) ** 1.80618
    f = (0.7643 * pp**0.6478 + 2.2999 + 6.5502 * m_own / m_other) / (pp**0.6478 + 2.3670 - 0.8552 * m_own / m_other)
    eff = (nd + g * na if electron else na + g * nd) + other / f
    mu_l = mu_max * t**-theta
    mu_n = mu_max**2 / (mu_max - mu_min) * t ** (3 * alpha - 1.5)
    mu_c = mu_max * mu_min / (mu_max - mu_min) * t**-0.5
    mu_i = mu_n * (nsc / eff) * (n_ref / nsc) ** alpha + mu_c * (c / eff)
    return 1 / (1 / mu_l + 1 / mu_i)


def doping():
    x = np.concatenate([np.linspace(0, 2.5e-4, 540), np.geomspace(2.505e-4, 525e-4, 60)])
    dt = 6.0e-12 + 3.0e-11
    acceptors = diffused_gaussian(x, 2e13, 1.9e-5, 6.0e-6, dt) + diffused_gaussian(x, 5e12, 0.9e-5, 3.5e-6, dt)
    donors = diffused_gaussian(x, 4e14, 4.5e-6, 1.6e-6, dt) + 1.3e15
    return x, donors, acceptors


NI = 5.29e19 * (T / 300) ** 2.54 * np.exp(-6726 / T)


def neutral(net):
    major = np.abs(net) / 2 + np.sqrt((net / 2) ** 2 + NI**2)
    return np.where(net > 0, major, NI**2 / major), np.where(net > 0, NI**2 / major, major)


def poisson(x, net):
    """Finite volumes, damped Newton, banded solve: the vectorised way."""
    flux = 11.7 * 8.8541878128e-14 * K * T / Q
    h = np.diff(x)
    a = flux / h
    volume = np.zeros_like(x)
    volume[:-1] += h / 2
    volume[1:] += h / 2
    stiffness = np.zeros_like(x)
    stiffness[:-1] += a
    stiffness[1:] += a
    u = np.arcsinh(net / (2 * NI))
    bands = np.zeros((3, len(x)))
    for _ in range(200):
        n, p = NI * np.exp(u), NI * np.exp(-u)
        right = volume * (p - n + net)
        right[:-1] += a * np.diff(u)
        right[1:] -= a * np.diff(u)
        bands[0, 1:] = -a
        bands[1] = stiffness + volume * (n + p)
        bands[2, :-1] = -a
        step = solve_banded((1, 1), bands, right)
        u = u + np.sign(step) * np.log1p(np.abs(step))
        if np.max(np.abs(step)) < 1e-8:
            break
    return NI * np.exp(u), NI * np.exp(-u)


def sheets(x, donors, acceptors, n, p):
    sigma = Q * (n * klaassen(donors, acceptors, n, p, True) + p * klaassen(donors, acceptors, n, p, False))
    cuts = np.flatnonzero(np.sign((n - p)[1:]) != np.sign((n - p)[:-1])) + 1
    bounds = [0, *cuts, len(x) - 1]
    return [1 / np.trapezoid(sigma[a : b + 1], x[a : b + 1]) for a, b in zip(bounds[:-1], bounds[1:])]


def timed(chain, runs):
    for _ in range(20):
        chain()
    times = []
    for _ in range(runs):
        start = time.perf_counter()
        chain()
        times.append(1e3 * (time.perf_counter() - start))
    return float(np.median(times))


def main():
    runs = int(sys.argv[1])
    x, donors, acceptors = doping()
    net = donors - acceptors
    print(
        json.dumps(
            {
                "neutral": timed(lambda: sheets(x, donors, acceptors, *neutral(net)), runs),
                "poisson": timed(lambda: sheets(x, donors, acceptors, *poisson(x, net)), runs),
            }
        )
    )


if __name__ == "__main__":
    main()
