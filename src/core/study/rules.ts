/** What one key demands of another: rules that no single field can check. */

import { dopantOf } from '../material/dopants';
import type { StudyProblem } from './problem';
import type { Study, StudyStep } from './schema';

/** Problems that lie between the keys of an otherwise valid study. */
export function crossFieldProblems(study: Study): StudyProblem[] {
  return [
    ...waferProblems(study),
    ...surfaceProblems(study),
    ...oxideProblems(study),
    ...study.steps.flatMap((step, i) => stepProblems(step, `steps[${i}]`)),
  ];
}

function waferProblems({ wafer }: Study): StudyProblem[] {
  const problems: StudyProblem[] = [];
  const given = [wafer.concentration_cm3, wafer.resistivity_ohmCm].filter((value) => value !== undefined);
  if (given.length !== 1)
    problems.push({
      key: 'wafer',
      message: `${given.length === 0 ? 'the doping is missing' : 'the doping is stated twice'}; give either concentration_cm3 or resistivity_ohmCm`,
    });
  if (wafer.buriedOxide_um !== undefined && wafer.buriedOxide_um > wafer.thickness_um)
    problems.push({
      key: 'wafer.buriedOxide_um',
      message: `found ${wafer.buriedOxide_um}; it must lie within the wafer's ${wafer.thickness_um} um`,
    });
  return problems;
}

function surfaceProblems({ surface }: Study): StudyProblem[] {
  if (!surface) return [];
  const given = [surface.charge_cm2, surface.potential_V].filter((value) => value !== undefined);
  if (given.length === 1) return [];
  return [
    {
      key: 'surface',
      message: `the surface is ${given.length === 0 ? 'not stated' : 'stated twice'}; give either charge_cm2 or potential_V, or leave surface out`,
    },
  ];
}

/** Steps that need bare silicon must not come while grown oxide lies on it. */
function oxideProblems({ steps }: Study): StudyProblem[] {
  let grownBy: number | null = null;
  return steps.flatMap((step, i): StudyProblem[] => {
    if (step.disabled) return [];
    if (step.step === 'oxidation') grownBy = i;
    if (step.step === 'stripOxide') grownBy = null;
    const needsSilicon = step.step === 'epitaxy' || step.step === 'etch' || step.step === 'predeposition';
    const hasNitride = step.step === 'implant' && step.screen?.material === 'nitride';
    if (grownBy === null || !(needsSilicon || hasNitride)) return [];
    return [
      {
        key: `steps[${i}]`,
        message: `${hasNitride ? 'a nitride screen' : step.step} cannot come on the oxide of steps[${grownBy}]; put a stripOxide step before it`,
      },
    ];
  });
}

function stepProblems(step: StudyStep, key: string): StudyProblem[] {
  switch (step.step) {
    case 'uniform':
      return step.to_um > step.from_um
        ? []
        : [
            {
              key: `${key}.to_um`,
              message: `found ${step.to_um}; it must be deeper than from_um ${step.from_um}`,
            },
          ];
    case 'implant':
      return step.tail === undefined || dopantOf(step.dopant) === 'boron'
        ? []
        : [
            {
              key: `${key}.tail`,
              message: `a tail is published for boron alone; leave it out for ${step.dopant}`,
            },
          ];
    case 'anneal':
      return step.transient === undefined ||
        step.endTemperature_C === undefined ||
        step.endTemperature_C === step.temperature_C
        ? []
        : [
            {
              key: `${key}.transient`,
              message:
                'the estimate is for one temperature; leave endTemperature_C out, or put a step of constant temperature before the ramp',
            },
          ];
    case 'epitaxy':
      return (step.dopant === undefined) === (step.concentration_cm3 === undefined)
        ? []
        : [{ key, message: 'a doped layer needs both dopant and concentration_cm3; an undoped one neither' }];
    case 'table':
      return tableProblems(step, key);
    default:
      return [];
  }
}

function tableProblems(step: Extract<StudyStep, { step: 'table' }>, key: string): StudyProblem[] {
  const { depth_um: depth, concentration_cm3: concentration } = step;
  if (depth === undefined && concentration === undefined)
    return step.file === undefined
      ? [{ key, message: 'the data are missing; give either file, or depth_um with concentration_cm3' }]
      : [];
  if (depth === undefined || concentration === undefined)
    return [{ key, message: 'embedded data need both depth_um and concentration_cm3' }];
  if (step.file !== undefined)
    return [{ key: `${key}.file`, message: 'the data are stated twice; give either file or embedded data' }];
  if (depth.length !== concentration.length)
    return [
      {
        key: `${key}.concentration_cm3`,
        message: `${concentration.length} values for ${depth.length} depths; both lists must be of one length`,
      },
    ];
  const wrong = depth.findIndex((x, i) => i > 0 && x <= depth[i - 1]);
  if (wrong > 0)
    return [
      {
        key: `${key}.depth_um[${wrong}]`,
        message: `found ${depth[wrong]} after ${depth[wrong - 1]}; depths must ascend`,
      },
    ];
  return [];
}
