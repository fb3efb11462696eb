/** A recipe step in one line, for its closed card. */

import { DOPANT_FACTS, formatQuantity, type StudyStep } from '../../core/index';

const symbol = (dopant: keyof typeof DOPANT_FACTS | 'BF2'): string =>
  dopant === 'BF2' ? 'BF₂' : DOPANT_FACTS[dopant].symbol;
const cm3 = (value: number): string => `${formatQuantity(value, 'concentration')} cm⁻³`;

export function stepSummary(step: StudyStep): string {
  switch (step.step) {
    case 'implant': {
      const film = step.screen ? `, ${step.screen.thickness_nm} nm ${step.screen.material}` : '';
      return `${symbol(step.dopant)} ${formatQuantity(step.dose_cm2, 'dose')} cm⁻², ${step.energy_keV} keV${film}`;
    }
    case 'anneal': {
      const ramp = step.endTemperature_C === undefined ? '' : ` to ${step.endTemperature_C}`;
      return `${step.temperature_C}${ramp} °C, ${step.time_min} min`;
    }
    case 'predeposition':
      return `${symbol(step.dopant)} at ${step.temperature_C} °C, ${step.time_min} min`;
    case 'epitaxy':
      return `${step.thickness_um} µm${step.dopant ? `, ${symbol(step.dopant)} ${cm3(step.concentration_cm3 ?? 0)}` : ', undoped'}`;
    case 'etch':
      return `${step.thickness_um} µm removed`;
    case 'oxidation':
      return `${step.ambient}, ${step.temperature_C} °C, ${step.time_min} min`;
    case 'stripOxide':
      return 'all grown oxide';
    case 'table':
      return `${symbol(step.dopant)}, ${step.source?.name ?? step.file ?? 'embedded'}`;
    case 'gaussian':
      return `${symbol(step.dopant)} ${cm3(step.peak_cm3)} at ${step.depth_um} µm, σ ${step.sigma_um} µm`;
    case 'erfc':
      return `${symbol(step.dopant)} ${cm3(step.surface_cm3)}, length ${step.length_um} µm`;
    case 'uniform':
      return `${symbol(step.dopant)} ${cm3(step.concentration_cm3)}, ${step.from_um} to ${step.to_um} µm`;
  }
}
