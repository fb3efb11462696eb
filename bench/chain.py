"""The same chain as an engineer would write it today with NumPy and SciPy: the yardstick of `npm run bench`.

Three implants with two anneals on 600 fixed depths: profiles in closed form, neutral carriers, Klaassen mobility
(Solid-State Electron. 35, 953, 1992), layers between sign changes, sheet resistance by the trapezoid rule.
Prints the median of the repeated runs in milliseconds and the sheet resistances, as JSON.
"""

import json
import sys
import time

import numpy as np
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


def chain():
    x = np.concatenate([np.linspace(0, 2.5e-4, 540), np.geomspace(2.505e-4, 525e-4, 60)])
    dt = 6.0e-12 + 3.0e-11
    acceptors = diffused_gaussian(x, 2e13, 1.9e-5, 6.0e-6, dt) + diffused_gaussian(x, 5e12, 0.9e-5, 3.5e-6, dt)
    donors = diffused_gaussian(x, 4e14, 4.5e-6, 1.6e-6, dt) + 1.3e15
    net = donors - acceptors
    ni = 5.29e19 * (T / 300) ** 2.54 * np.exp(-6726 / T)
    major = np.abs(net) / 2 + np.sqrt((net / 2) ** 2 + ni**2)
    n = np.where(net > 0, major, ni**2 / major)
    p = np.where(net > 0, ni**2 / major, major)
    sigma = Q * (n * klaassen(donors, acceptors, n, p, True) + p * klaassen(donors, acceptors, n, p, False))
    cuts = np.flatnonzero(np.sign(net[1:]) != np.sign(net[:-1])) + 1
    bounds = [0, *cuts, len(x) - 1]
    return [1 / np.trapezoid(sigma[a : b + 1], x[a : b + 1]) for a, b in zip(bounds[:-1], bounds[1:])]


def main():
    runs = int(sys.argv[1])
    for _ in range(20):
        chain()
    times = []
    for _ in range(runs):
        start = time.perf_counter()
        sheets = chain()
        times.append(1e3 * (time.perf_counter() - start))
    print(json.dumps({"median_ms": float(np.median(times)), "sheets": [float(s) for s in sheets]}))


if __name__ == "__main__":
    main()
