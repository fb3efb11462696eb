/** Which sign is the decimal sign: decided by evidence for the whole table, and left open where the evidence is missing. */

import type { DecimalSign } from './numbers';

/** What one field shows about the decimal sign: `sure` leaves no other reading, `open` may also group thousands. */
interface Sign {
  decimal: DecimalSign;
  sure: boolean;
  /** The field shows the other sign grouping thousands. */
  groups: boolean;
}

export interface DecimalEvidence {
  /** Absent: the table can be read either way. */
  decimal?: DecimalSign;
  /** The other sign was seen to group thousands. */
  otherGroups: boolean;
  /** Two fields that contradict each other. */
  conflict?: [Sighting, Sighting];
  /** A field that can be read either way. */
  open?: Sighting;
}

export interface Sighting {
  field: string;
  /** Line from 1. */
  line: number;
}

/**
 * Weighs every field. A point alone is taken as the decimal sign; a comma alone before exactly three digits, in every case,
 * stays open.
 */
export function weighDecimal(fields: Iterable<Sighting>): DecimalEvidence {
  const sure: Partial<Record<DecimalSign, Sighting>> = {};
  const open: Partial<Record<DecimalSign, Sighting>> = {};
  const grouping: Partial<Record<DecimalSign, boolean>> = {};
  for (const { field, line } of fields) {
    const sign = signOf(field);
    if (!sign) continue;
    const store = sign.sure ? sure : open;
    store[sign.decimal] ??= { field, line };
    if (sign.groups) grouping[sign.decimal === '.' ? ',' : '.'] = true;
  }
  if (sure['.'] && sure[',']) return { otherGroups: false, conflict: [sure['.'], sure[',']] };
  const decimal: DecimalSign | undefined = sure['.'] ? '.' : sure[','] ? ',' : undefined;
  if (decimal) {
    const other = decimal === '.' ? ',' : '.';
    const otherGroups = grouping[other] === true;
    return open[other] && !otherGroups ? { otherGroups, open: open[other] } : { decimal, otherGroups };
  }
  return open[','] ? { otherGroups: false, open: open[','] } : { decimal: '.', otherGroups: false };
}

const NUMBER = /^[<\u2264]?\s*[+\-\u2212]?(\d[\d.,\u00a0\u2009\u202f'\u2019]*|[.,]\d+)(.*)$/;

function signOf(text: string): Sign | undefined {
  const found = NUMBER.exec(text);
  if (!found) return undefined;
  const body = found[1].replace(/[^\d.,]/g, '');
  const scaled = found[2] !== '';
  const commas = body.split(',').length - 1;
  const points = body.split('.').length - 1;
  if (commas + points === 0) return undefined;
  if (commas > 0 && points > 0) {
    const decimal: DecimalSign = body.lastIndexOf(',') > body.lastIndexOf('.') ? ',' : '.';
    return { decimal, sure: true, groups: true };
  }
  const sign: DecimalSign = commas > 0 ? ',' : '.';
  if (commas + points > 1) return { decimal: sign === ',' ? '.' : ',', sure: true, groups: true };
  const [whole, fraction] = body.split(sign);
  const couldGroup = fraction.length === 3 && /^[1-9]\d{0,2}$/.test(whole) && !scaled;
  return { decimal: sign, sure: !couldGroup, groups: false };
}
