import { axes, type ModelBeam, type ModelCase, type ModelPath } from './case';
import { Dec, ONE, PI, ZERO, dec, maxOf, minOf } from './decimal';
import { airTransmission, apertureFraction, isGaussian, widthsAt, type Growth } from './geometry';
import { SMALL, alphaMax, factor, type Side, type Source } from './limits';
import { candidatesOf, type Candidate } from './pulses';

/** How an exposure is looked at. */
interface View {
  readonly side: Side;
  readonly aided: boolean;
  /** Only distances may use the peak. */
  readonly peak: boolean;
  readonly air: boolean;
}

/** A candidate with the exposure over its own aperture at a place. */
export interface Compared {
  readonly candidate: Candidate;
  readonly exposure: Dec;
  readonly ratio: Dec;
}

export interface ModelBeamResult {
  readonly governing: Compared;
  readonly all: readonly Compared[];
  readonly distanceM: Dec;
  readonly opticalDensity: Dec;
  readonly at?: { readonly ratio: Dec; readonly compared: readonly Compared[] };
}

export interface ModelSideResult {
  readonly perBeam: readonly ModelBeamResult[];
  readonly hazardDistanceM: Dec;
  readonly aidedHazardDistanceM?: Dec;
  readonly opticalDensity: Dec;
  readonly at?: { readonly opticalDensity: Dec };
}

const NEAREST_DIFFUSE_M = dec('0.1');

export class HazardModel {
  private readonly path: ModelPath;
  private readonly growth: Growth;
  private readonly peak: boolean;
  private readonly fixed = new Map<string, Candidate[]>();

  constructor(private readonly hazardCase: ModelCase) {
    const ansi = hazardCase.ruleSet.startsWith('ansi');
    this.path = hazardCase.path ?? { kind: 'direct' };
    this.growth = hazardCase.model?.growth ?? (ansi ? 'hyperbolic' : 'linear');
    this.peak = hazardCase.model?.onAxis === 'peak';
  }

  evaluate(side: Side): ModelSideResult {
    const { at, aid } = this.hazardCase;
    const perBeam = this.perBeam(side);
    const hazardDistanceM = this.distance(side, false);
    const aided = aid && side === 'eye' ? this.distance(side, true) : undefined;
    return {
      perBeam,
      hazardDistanceM,
      opticalDensity: density(largestSum(perBeam.map((beam) => beam.all))),
      ...(aided ? { aidedHazardDistanceM: maxOf([aided, hazardDistanceM]) } : {}),
      ...(at
        ? { at: { opticalDensity: density(largestSum(perBeam.map((b) => b.at!.compared))) } }
        : {}),
    };
  }

  /** The beams one by one, without the distances of all. */
  perBeam(side: Side): ModelBeamResult[] {
    return this.hazardCase.beams.map((beam) => this.beamResult(beam, side));
  }

  private beamResult(beam: ModelBeam, side: Side): ModelBeamResult {
    const view: View = { side, aided: false, peak: false, air: false };
    const distanceM = this.worstPlace(beam, view);
    const all = this.compare(beam, distanceM, view);
    const governing = largest(all);
    const place = this.hazardCase.at;
    const there = place && this.compare(beam, dec(place.distanceM), { ...view, air: true });
    return {
      governing,
      all,
      distanceM,
      opticalDensity: density(governing.ratio),
      ...(there ? { at: { ratio: largest(there).ratio, compared: there } } : {}),
    };
  }

  /** Exposure over limit of every candidate of a beam at a distance. */
  compare(beam: ModelBeam, r: Dec, view: View): Compared[] {
    const candidates = this.candidates(beam, r, view);
    const air = view.air ? airTransmission(this.hazardCase, r) : ONE;
    const perAperture = new Map<string, Dec>();
    return candidates.map((candidate) => {
      const key = candidate.apertureMm.toString();
      const density =
        perAperture.get(key) ?? this.exposurePerUnit(beam, r, candidate.apertureMm, view);
      perAperture.set(key, density);
      const exposure = density.mul(air).mul(this.quantity(beam, view.side));
      return { candidate, exposure, ratio: exposure.div(candidate.limit) };
    });
  }

  /** Pulse energy, or for CW the energy over the exposure duration. */
  private quantity(beam: ModelBeam, side: Side): Dec {
    const { emission } = beam;
    if (emission.mode !== 'cw') return dec(emission.pulseEnergyJ);
    return dec(emission.powerW).mul(dec(this.exposureS(side)));
  }

  private exposureS(side: Side): number {
    const { eyeS, skinS } = this.hazardCase.exposure;
    return side === 'eye' ? eyeS : (skinS ?? eyeS);
  }

  private candidates(beam: ModelBeam, r: Dec, view: View): Candidate[] {
    const moving = this.path.kind === 'diffuse' && this.path.spotMm !== undefined;
    const key = `${this.hazardCase.beams.indexOf(beam)} ${view.side} ${view.aided}`;
    const known = moving && view.side === 'eye' ? undefined : this.fixed.get(key);
    if (known) return known;
    const candidates = candidatesOf({
      side: view.side,
      exposureS: this.exposureS(view.side),
      emission: beam.emission,
      at: {
        ruleSet: this.hazardCase.ruleSet,
        wavelengthNm: beam.wavelengthNm,
        source: this.source(beam, r, view),
      },
    });
    this.fixed.set(key, candidates);
    return candidates;
  }

  /** The apparent source: given, or the illuminated spot seen from r; larger through an aid. */
  private source(beam: ModelBeam, r: Dec, view: View): Source {
    const larger =
      view.aided && this.aidWorks(beam) ? dec(this.hazardCase.aid!.magnification) : ONE;
    if (this.path.kind === 'diffuse' && this.path.spotMm !== undefined) {
      const plain = dec(this.path.spotMm).div(r).mul(larger);
      return { x: plain.mul(cosine(this.path.angleDeg)), y: plain };
    }
    if (beam.sourceMrad === undefined) return SMALL;
    const [x, y] = axes(beam.sourceMrad);
    return { x: dec(x).mul(larger), y: dec(y).mul(larger) };
  }

  private aidWorks(beam: ModelBeam): boolean {
    return beam.wavelengthNm >= 302 && beam.wavelengthNm < 2800;
  }

  /** Irradiance over the aperture for one watt, W/m². */
  private exposurePerUnit(beam: ModelBeam, r: Dec, apertureMm: Dec, view: View): Dec {
    const aid = view.aided && this.aidWorks(beam) ? this.hazardCase.aid : undefined;
    const collecting = aid
      ? minOf([dec(aid.objectiveMm), dec(aid.magnification).mul(apertureMm)])
      : apertureMm;
    const transmission = aid ? dec(aid.transmission) : ONE;
    if (this.path.kind === 'diffuse' || view.peak) {
      const gain = transmission.mul(collecting.div(apertureMm).pow(2));
      return this.pointValue(beam, r).mul(gain);
    }
    const gaussian = isGaussian(beam, this.path);
    const widths = widthsAt(beam, this.path, this.growth, r);
    const passing = apertureFraction(gaussian, collecting.div(1000), widths);
    return transmission.mul(passing).div(discArea(apertureMm.div(1000)));
  }

  private pointValue(beam: ModelBeam, r: Dec): Dec {
    if (this.path.kind !== 'diffuse') {
      const [x, y] = widthsAt(beam, this.path, this.growth, r);
      return new Dec(4).div(PI.mul(x).mul(y));
    }
    const spot = dec(this.path.spotMm ?? 0).div(1000);
    const spread = r.pow(2).add(spot.pow(2).div(4));
    return dec(this.path.reflectance).mul(cosine(this.path.angleDeg)).div(PI.mul(spread));
  }

  /** Where the exposure over the limit is largest. */
  private worstPlace(beam: ModelBeam, view: View): Dec {
    if (this.path.kind === 'diffuse') {
      if (this.path.spotMm === undefined) return NEAREST_DIFFUSE_M;
      return this.worstDiffusePlace(beam, view);
    }
    if (this.path.kind === 'direct') return maxOf([ZERO, dec(beam.waistDistanceM ?? 0)]);
    return ZERO;
  }

  private worstDiffusePlace(beam: ModelBeam, view: View): Dec {
    const at = (r: Dec): Dec => largest(this.compare(beam, r, view)).ratio;
    const places = [
      NEAREST_DIFFUSE_M,
      ...this.diffusePlaces().filter((r) => r.gte(NEAREST_DIFFUSE_M)),
    ];
    let best = 0;
    const values = places.map(at);
    values.forEach((value, i) => {
      if (value.gt(values[best]!)) best = i;
    });
    const low = places[Math.max(0, best - 1)]!;
    const high = places[Math.min(places.length - 1, best + 1)]!;
    const inside = goldenMaximum(at, low, high);
    return at(inside).gt(values[best]!) ? inside : places[best]!;
  }

  /** A ladder of distances for a spot, with both sides of every step of the tables. */
  private diffusePlaces(): Dec[] {
    if (this.path.kind !== 'diffuse' || this.path.spotMm === undefined) return [];
    const spotM = dec(this.path.spotMm).div(1000);
    const cos = cosine(this.path.angleDeg);
    const scales = [ONE, cos, ONE.add(cos).div(2)];
    const magnify = this.hazardCase.aid ? [1, this.hazardCase.aid.magnification] : [1];
    const steps = this.stepAnglesMrad().flatMap((alpha) =>
      scales.flatMap((scale) => magnify.map((m) => spotM.mul(scale).mul(m).div(alpha).mul(1000))),
    );
    const sides = steps.flatMap((r) => [
      r,
      r.mul(ONE.sub(dec('1e-13'))),
      r.mul(ONE.add(dec('1e-13'))),
    ]);
    const ladder: Dec[] = [];
    const top = maxOf(steps).mul(1.1);
    for (let r = spotM.div(100); r.lt(top); r = r.mul(1.3)) ladder.push(r);
    const sorted = [...ladder, ...sides, top].sort((a, b) => a.cmp(b));
    return sorted.filter((r, i) => i === 0 || !r.eq(sorted[i - 1]!));
  }

  /** Angles at which a limit or its slope steps: of C_P, of IEC's footnote, alpha_max and gamma_ph. */
  private stepAnglesMrad(): Dec[] {
    const { ruleSet, beams, exposure } = this.hazardCase;
    const durations = new Set([exposure.eyeS]);
    for (const { emission } of beams) {
      if (emission.mode !== 'cw') durations.add(emission.pulseDurationS);
    }
    const moving = [...durations].flatMap((durationS) => {
      const reading = { ruleSet, wavelengthNm: 500, durationS, source: SMALL };
      const gamma = factor('gamma_ph', reading);
      return [alphaMax(reading), ...(gamma ? [gamma] : [])];
    });
    return [...['1.5', '5', '82', '100'].map(dec), ...moving];
  }

  /** The largest distance at which a sum over a tissue reaches one. */
  private distance(side: Side, aided: boolean): Dec {
    const view: View = { side, aided, peak: this.peak, air: true };
    const sum = (r: Dec): Dec =>
      largestSum(this.hazardCase.beams.map((beam) => this.compare(beam, r, view)));
    const places = this.startingPlaces();
    const last = places[places.length - 1]!;
    if (sum(last).gte(1)) {
      let [low, high] = [last, maxOf([last.mul(2), dec('1e-3')])];
      while (sum(high).gte(1)) [low, high] = [high, high.mul(16)];
      return bisect(sum, low, high);
    }
    for (let i = places.length - 1; i > 0; i--) {
      if (sum(places[i - 1]!).gte(1)) return bisect(sum, places[i - 1]!, places[i]!);
    }
    return ZERO;
  }

  /** Beyond the last of these the exposure over the limit only falls. */
  private startingPlaces(): Dec[] {
    if (this.path.kind === 'direct') {
      const far = maxOf(this.hazardCase.beams.map((beam) => dec(beam.waistDistanceM ?? 0)));
      if (far.isZero()) return [ZERO];
      return Array.from({ length: 41 }, (_, i) => far.mul(i).div(40));
    }
    const spots = this.diffusePlaces();
    return spots.length > 0 ? [dec('1e-9'), ...spots] : [dec('1e-9')];
  }
}

function cosine(angleDeg: number): Dec {
  return dec(angleDeg).mul(PI).div(180).cos();
}

function discArea(diameterM: Dec): Dec {
  return PI.mul(diameterM.pow(2)).div(4);
}

/** What exceeds its limit most. */
export function largest(compared: readonly Compared[]): Compared {
  return compared.reduce((a, b) => (b.ratio.gt(a.ratio) ? b : a));
}

/** Ratios add on the same tissue; a beam counts there with its most restrictive candidate. */
function largestSum(beams: readonly (readonly Compared[])[]): Dec {
  const sums = new Map<string, Dec>();
  for (const compared of beams) {
    const own = new Map<string, Dec>();
    for (const { candidate, ratio } of compared) {
      own.set(candidate.tissue, maxOf([ratio, own.get(candidate.tissue) ?? ZERO]));
    }
    for (const [tissue, ratio] of own) sums.set(tissue, ratio.add(sums.get(tissue) ?? ZERO));
  }
  return maxOf([...sums.values()]);
}

function density(ratio: Dec): Dec {
  return ratio.gt(1) ? ratio.log(10) : ZERO;
}

/**
 * Encloses the crossing of one until the ends agree to 1e-12: false position on the logarithms of
 * both, every third time and wherever that says nothing, the middle.
 */
function bisect(sum: (r: Dec) => Dec, from: Dec, to: Dec): Dec {
  let [low, high] = [from, to];
  let [above, below] = [excess(sum(low)), excess(sum(high))];
  for (let step = 0; high.sub(low).gt(high.mul(1e-12)) && high.gt(1e-12); step++) {
    const part = step % 3 === 2 ? 0.5 : above / (above - below);
    // A little beyond the guess, so that both ends move.
    const guess = Number.isFinite(part) ? Math.min(0.999, Math.max(1e-3, part)) : 0.5;
    const nudged = guess + (step % 2 === 0 ? 1e-3 : -1e-3) * Math.min(guess, 1 - guess);
    const place = low.isZero() ? high.mul(nudged) : low.mul(high.div(low).toNumber() ** nudged);
    const value = sum(place);
    if (value.gte(1)) [low, above] = [place, excess(value)];
    else [high, below] = [place, excess(value)];
  }
  return low;
}

const excess = (value: Dec): number => Math.log(value.toNumber());

/** Golden section, until the place is known to 1e-7: the top is flat, its value far better. */
function goldenMaximum(f: (r: Dec) => Dec, from: Dec, to: Dec): Dec {
  const ratio = new Dec(5).sqrt().sub(1).div(2);
  let [low, high] = [from, to];
  let [left, right] = [high.sub(high.sub(low).mul(ratio)), low.add(high.sub(low).mul(ratio))];
  let [atLeft, atRight] = [f(left), f(right)];
  while (high.sub(low).gt(high.mul(1e-7))) {
    if (atLeft.gte(atRight)) {
      [high, right, atRight] = [right, left, atLeft];
      left = high.sub(high.sub(low).mul(ratio));
      atLeft = f(left);
    } else {
      [low, left, atLeft] = [left, right, atRight];
      right = low.add(high.sub(low).mul(ratio));
      atRight = f(right);
    }
  }
  return low.add(high).div(2);
}
