import { burstDuration } from '../pulses/emission-timing';
import type { BurstEmission } from '../case';
import { DURATION } from './check-parts';
import type { FieldCheck, Fields, NumberRange } from './field-check';

const FIELDS_OF_MODE = {
  cw: ['mode', 'powerW'],
  single: ['mode', 'pulseEnergyJ', 'pulseDurationS'],
  repetitive: ['mode', 'pulseEnergyJ', 'pulseDurationS', 'repetitionRateHz'],
  burst: [
    'mode',
    'pulseEnergyJ',
    'pulseDurationS',
    'pulsesPerBurst',
    'intraBurstRateHz',
    'burstRateHz',
  ],
} as const;

const MODES = Object.keys(FIELDS_OF_MODE) as readonly (keyof typeof FIELDS_OF_MODE)[];

const WHOLE: NumberRange = {
  isInside: (value) => Number.isInteger(value) && value >= 1,
  allowed: 'a whole number from 1',
};

/** A pulse may fill its period; more than this is longer than it. */
const LONGEST_DUTY = 1 + 1e-9;

/** Checks how the light is emitted in time. */
export function checkEmission(check: FieldCheck, emission: unknown, path: string): void {
  const mode = (emission as { mode?: unknown } | null | undefined)?.mode;
  const known = MODES.find((name) => name === mode);
  const fields = check.object(
    emission,
    path,
    known === undefined ? ['mode'] : FIELDS_OF_MODE[known],
  );
  if (fields === undefined) return;
  if (known === undefined) {
    check.choice(mode, `${path}.mode`, MODES, 'There is no such mode');
  } else if (known === 'cw') {
    check.number(fields['powerW'], `${path}.powerW`);
  } else {
    const isEnergy = check.number(fields['pulseEnergyJ'], `${path}.pulseEnergyJ`);
    const isDuration = check.number(fields['pulseDurationS'], `${path}.pulseDurationS`, DURATION);
    if (known === 'repetitive') checkRepetition(check, fields, path, isDuration);
    if (known === 'burst') checkBurst(check, fields, path, isEnergy && isDuration);
  }
}

function checkRepetition(
  check: FieldCheck,
  fields: Fields,
  path: string,
  isDuration: boolean,
): void {
  const rate = fields['repetitionRateHz'];
  if (!check.number(rate, `${path}.repetitionRateHz`) || !isDuration) return;
  checkPeriod(check, fields['pulseDurationS'] as number, rate, {
    path: `${path}.pulseDurationS`,
    what: 'The pulse is longer than its period',
  });
}

function checkBurst(check: FieldCheck, fields: Fields, path: string, isPulse: boolean): void {
  const isCount = check.number(fields['pulsesPerBurst'], `${path}.pulsesPerBurst`, WHOLE);
  const isIntra = check.number(fields['intraBurstRateHz'], `${path}.intraBurstRateHz`);
  const isRate = check.number(fields['burstRateHz'], `${path}.burstRateHz`);
  if (!(isPulse && isCount && isIntra && isRate)) return;
  const burst = fields as unknown as BurstEmission;
  const isFitting = checkPeriod(check, burst.pulseDurationS, burst.intraBurstRateHz, {
    path: `${path}.pulseDurationS`,
    what: 'The pulse is longer than its period within the burst',
  });
  if (!isFitting) return;
  checkPeriod(check, burstDuration(burst), burst.burstRateHz, {
    path: `${path}.burstRateHz`,
    what: 'The burst is longer than its period',
  });
}

function checkPeriod(
  check: FieldCheck,
  durationS: number,
  rateHz: number,
  { path, what }: { path: string; what: string },
): boolean {
  if (durationS * rateHz <= LONGEST_DUTY) return true;
  check.fail(path, `${what}: ${durationS} s against ${1 / rateHz} s.`, 'a duration up to 1 / rate');
  return false;
}
