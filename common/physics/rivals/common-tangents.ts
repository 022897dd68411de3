import { EV_PER_CUBIC_ANGSTROM_IN_GPA } from '#common/units/constants';

/** One structure's energy against volume, both per formula unit. */
export interface EnergyVolumeCurve {
  /** Volumes ascending, at least three; Å³ and eV. */
  readonly points: readonly { readonly volumeA3: number; readonly energyEv: number }[];
}

/** A line that touches two curves from below: both structures coexist at its pressure. */
export interface CommonTangent {
  /** Index of the curve stable at the larger volume (lower pressure), and of the denser one. */
  readonly from: number;
  readonly to: number;
  /** p = −dE/dV; negative means tension. */
  readonly pressureGpa: number;
  readonly fromVolumeA3: number;
  readonly toVolumeA3: number;
  /** True where a curve ends at the line: the pressure is then a bound of the samples, not a tangent. */
  readonly touchesEnd: boolean;
}

interface Sample {
  readonly curve: number;
  readonly index: number;
  readonly volumeA3: number;
  readonly energyEv: number;
}

/**
 * Transitions between structures at 0 K: at pressure p the stable one has the least enthalpy
 * H = min_V (E + p V), so coexisting structures share a tangent of slope −p, and all such tangents
 * lie on the lower convex hull of the curves together (textbook thermodynamics: Legendre
 * transform and common-tangent construction). The hull of the samples finds the pairs; the
 * parabolas through the three samples at each end make pressure and volumes exact to second order.
 * @returns tangents by falling volume, that is by rising pressure
 * @throws RangeError when a curve has fewer than three points or volumes do not ascend
 */
export function commonTangents(curves: readonly EnergyVolumeCurve[]): CommonTangent[] {
  curves.forEach(requireAscending);
  const samples = curves.flatMap(({ points }, curve) =>
    points.map((point, index) => ({ ...point, curve, index })),
  );
  const hull = lowerHull(samples);
  return hull
    .slice(1)
    .flatMap((right, index) => {
      const left = hull[index]!;
      return left.curve === right.curve ? [] : [tangentBetween(curves, left, right)];
    })
    .reverse();
}

function requireAscending({ points }: EnergyVolumeCurve): void {
  const ascends = points.every(
    ({ volumeA3 }, index) => index === 0 || volumeA3 > points[index - 1]!.volumeA3,
  );
  if (points.length < 3 || !ascends) {
    throw new RangeError('A curve takes three points or more, by ascending volume.');
  }
}

/** Lower convex hull, left to right; points on a straight stretch are left out. */
function lowerHull(samples: readonly Sample[]): Sample[] {
  const sorted = [...samples].sort((a, b) => a.volumeA3 - b.volumeA3 || a.energyEv - b.energyEv);
  const hull: Sample[] = [];
  for (const sample of sorted) {
    if (hull.at(-1)?.volumeA3 === sample.volumeA3) {
      continue;
    }
    while (hull.length > 1 && turn(hull.at(-2)!, hull.at(-1)!, sample) <= 0) {
      hull.pop();
    }
    hull.push(sample);
  }
  return hull;
}

function turn(a: Sample, b: Sample, c: Sample): number {
  return (
    (b.volumeA3 - a.volumeA3) * (c.energyEv - a.energyEv) -
    (b.energyEv - a.energyEv) * (c.volumeA3 - a.volumeA3)
  );
}

function tangentBetween(
  curves: readonly EnergyVolumeCurve[],
  left: Sample,
  right: Sample,
): CommonTangent {
  const chord = (left.energyEv - right.energyEv) / (right.volumeA3 - left.volumeA3);
  const atEnd = ({ curve, index }: Sample) =>
    index === 0 || index === curves[curve]!.points.length - 1;
  const touchesEnd = atEnd(left) || atEnd(right);
  const dense = parabolaAt(curves[left.curve]!, left.index);
  const wide = parabolaAt(curves[right.curve]!, right.index);
  const canRefine = !touchesEnd && dense.curvature > 0 && wide.curvature > 0;
  const pressure = canRefine ? equalEnthalpy(dense, wide, chord) : chord;
  return {
    from: right.curve,
    to: left.curve,
    pressureGpa: pressure * EV_PER_CUBIC_ANGSTROM_IN_GPA,
    fromVolumeA3: canRefine ? volumeAt(wide, pressure) : right.volumeA3,
    toVolumeA3: canRefine ? volumeAt(dense, pressure) : left.volumeA3,
    touchesEnd,
  };
}

/** E = energyEv + curvature/2 (V − volumeA3)². */
interface Parabola {
  readonly energyEv: number;
  readonly volumeA3: number;
  readonly curvature: number;
}

/** The parabola through a sample and its two neighbours, by Newton's divided differences. */
function parabolaAt({ points }: EnergyVolumeCurve, index: number): Parabola {
  const middle = Math.min(Math.max(index, 1), points.length - 2);
  const [a, b, c] = [points[middle - 1]!, points[middle]!, points[middle + 1]!];
  const ab = (b.energyEv - a.energyEv) / (b.volumeA3 - a.volumeA3);
  const bc = (c.energyEv - b.energyEv) / (c.volumeA3 - b.volumeA3);
  const curvature = (2 * (bc - ab)) / (c.volumeA3 - a.volumeA3);
  const slope = ab + (curvature / 2) * (b.volumeA3 - a.volumeA3);
  const offset = slope / curvature;
  return {
    energyEv: b.energyEv - (slope * offset) / 2,
    volumeA3: b.volumeA3 - offset,
    curvature,
  };
}

const volumeAt = ({ volumeA3, curvature }: Parabola, pressure: number) =>
  volumeA3 - pressure / curvature;

/** H(p) = E₀ + p V₀ − p²/(2k) of a parabola: its Legendre transform. */
const enthalpyAt = ({ energyEv, volumeA3, curvature }: Parabola, pressure: number) =>
  energyEv + pressure * volumeA3 - pressure ** 2 / (2 * curvature);

/** Newton's method on H₁(p) − H₂(p), whose derivative is V₁(p) − V₂(p); eV Å⁻³. */
function equalEnthalpy(dense: Parabola, wide: Parabola, start: number): number {
  let pressure = start;
  for (let step = 0; step < 20; step += 1) {
    const slope = volumeAt(dense, pressure) - volumeAt(wide, pressure);
    const change = (enthalpyAt(dense, pressure) - enthalpyAt(wide, pressure)) / slope;
    if (!Number.isFinite(change)) {
      return start;
    }
    pressure -= change;
    if (Math.abs(change) <= 1e-15 * Math.abs(pressure)) {
      break;
    }
  }
  return pressure;
}
