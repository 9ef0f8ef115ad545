import type { BurstEmission } from '../case';
import { burstDuration } from '../pulses/emission-timing';
import { DURATION } from './check-parts';
import type { FieldCheck, Fields, NumberRange } from './field-check';

const FIELDS_OF_MODE = {
  cw: new Set(['mode', 'powerW']),
  single: new Set(['mode', 'pulseEnergyJ', 'pulseDurationS']),
  repetitive: new Set(['mode', 'pulseEnergyJ', 'pulseDurationS', 'repetitionRateHz']),
  burst: new Set([
    'mode',
    'pulseEnergyJ',
    'pulseDurationS',
    'pulsesPerBurst',
    'intraBurstRateHz',
    'burstRateHz',
  ]),
} as const;

const MODES = Object.keys(FIELDS_OF_MODE) as readonly (keyof typeof FIELDS_OF_MODE)[];
const MODE_ALONE = new Set(['mode']);

const WHOLE: NumberRange = {
  isInside: (value) => Number.isInteger(value) && value >= 1,
  allowed: 'a whole number from 1',
};

/** A pulse may fill its period; more than this is longer than it. */
const LONGEST_DUTY = 1 + 1e-9;

/** Checks how the light is emitted in time. */
export function checkEmission(check: FieldCheck, emission: unknown): void {
  const given = (emission as { mode?: unknown } | null | undefined)?.mode;
  const mode = MODES.find((known) => known === given);
  const fields = check.object(emission, mode === undefined ? MODE_ALONE : FIELDS_OF_MODE[mode]);
  if (fields === undefined) return;
  if (mode === undefined) {
    check.choice(given, 'mode', MODES);
  } else if (mode === 'cw') {
    check.number(fields.powerW, 'powerW');
  } else {
    const isEnergy = check.number(fields.pulseEnergyJ, 'pulseEnergyJ');
    const isDuration = check.number(fields.pulseDurationS, 'pulseDurationS', DURATION);
    if (mode === 'repetitive') checkRepetition(check, fields, isDuration);
    if (mode === 'burst') checkBurst(check, fields, isEnergy && isDuration);
  }
}

function checkRepetition(check: FieldCheck, fields: Fields, isDuration: boolean): void {
  const rate = fields.repetitionRateHz;
  if (!check.number(rate, 'repetitionRateHz') || !isDuration) return;
  const what = 'The pulse is longer than its period';
  checkPeriod(check, 'pulseDurationS', what, { durationS: fields.pulseDurationS as number, rate });
}

function checkBurst(check: FieldCheck, fields: Fields, isPulse: boolean): void {
  const isCount = check.number(fields.pulsesPerBurst, 'pulsesPerBurst', WHOLE);
  const isIntra = check.number(fields.intraBurstRateHz, 'intraBurstRateHz');
  const isRate = check.number(fields.burstRateHz, 'burstRateHz');
  if (!(isPulse && isCount && isIntra && isRate)) return;
  const burst = fields as unknown as BurstEmission;
  const isPulseFitting = checkPeriod(
    check,
    'pulseDurationS',
    'The pulse is longer than its period within the burst',
    { durationS: burst.pulseDurationS, rate: burst.intraBurstRateHz },
  );
  if (!isPulseFitting) return;
  checkPeriod(check, 'burstRateHz', 'The burst is longer than its period', {
    durationS: burstDuration(burst),
    rate: burst.burstRateHz,
  });
}

function checkPeriod(
  check: FieldCheck,
  name: string,
  what: string,
  { durationS, rate }: { durationS: number; rate: number },
): boolean {
  if (durationS * rate <= LONGEST_DUTY) return true;
  check.fail(name, `${what}: ${durationS} s against ${1 / rate} s.`, 'a duration up to 1 / rate');
  return false;
}
