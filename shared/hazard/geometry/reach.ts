import type { BeamProfile, OnAxis } from '../case';
import { largestReach } from '../numeric/largest-reach';
import { exposureOfUnitPower } from './beam-exposure';
import type { BeamShape } from './beam-shape';
import { diffuseExposure, type DiffuseField } from './diffuse-field';

/** An exposure that falls with distance beyond the waist, and the limit it is compared with. */
export interface ReachQuery {
  readonly field: BeamShape | DiffuseField;
  readonly onAxis: OnAxis;
  readonly apertureM: number;
  /** W or J. */
  readonly powerOrEnergy: number;
  /** In W/m² or J/m², as the former. */
  readonly limit: number;
  /** Attenuation of the air, 1/m. */
  readonly attenuationPerM: number;
}

/** The largest distance at which the exposure reaches the limit, m; 0 when nowhere. */
export function reach(query: ReachQuery): number {
  const { field } = query;
  if (query.attenuationPerM > 0) return numericReach(query);
  if (field.kind === 'surface')
    return Math.sqrt((query.powerOrEnergy * field.strength) / query.limit);
  return field.isCircular ? circularReach(query, field) : numericReach(query);
}

/** The width of the circular beam at which the exposure equals the limit, m; NaN when at none. */
export function widthAtLimit(query: ReachQuery, profile: BeamProfile): number {
  const { onAxis, apertureM, powerOrEnergy, limit } = query;
  const peakWidth = Math.sqrt((4 * powerOrEnergy) / (Math.PI * limit));
  if (onAxis === 'peak') return peakWidth;
  const fractionAtLimit = (apertureM / peakWidth) ** 2;
  if (profile === 'top-hat') return fractionAtLimit > 1 ? NaN : peakWidth;
  if (fractionAtLimit >= 1) return NaN;
  return apertureM / Math.sqrt(-Math.log1p(-fractionAtLimit));
}

/** Solves the growth of the beam for the distance, m. */
export function distanceOfWidth(shape: BeamShape, widthM: number): number {
  const { dx: d, phix: phi, waistM, growth } = shape;
  if (growth === 'linear') {
    const beyondWaist = Math.abs(waistM) + (widthM - d) / phi;
    return beyondWaist >= 0 ? Math.max(0, waistM + Math.abs(waistM) + (widthM - d) / phi) : 0;
  }
  const grown = ((widthM - d) * (widthM + d)) / (phi * phi);
  const square = waistM * waistM + grown;
  if (!(square >= 0)) return 0;
  // Why: for a waist behind the exit the plain sum would cancel.
  return waistM >= 0
    ? Math.max(0, waistM + Math.sqrt(square))
    : Math.max(0, grown / (Math.sqrt(square) - waistM));
}

function circularReach(query: ReachQuery, shape: BeamShape): number {
  const widthM = widthAtLimit(query, shape.profile);
  return Number.isNaN(widthM) ? 0 : distanceOfWidth(shape, widthM);
}

function numericReach(query: ReachQuery): number {
  const { field, onAxis, apertureM, powerOrEnergy, limit, attenuationPerM } = query;
  const ofUnitPower = (distanceM: number) =>
    field.kind === 'surface'
      ? diffuseExposure(field, distanceM)
      : exposureOfUnitPower(field, onAxis, apertureM, distanceM);
  const ratio = (distanceM: number) =>
    (powerOrEnergy / limit) * ofUnitPower(distanceM) * Math.exp(-attenuationPerM * distanceM);
  return largestReach(ratio, field.kind === 'beam' && field.waistM > 0 ? [field.waistM] : []);
}
