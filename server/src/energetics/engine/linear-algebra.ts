/** Dense symmetric matrices, row-major in a Float64Array. */

/**
 * L of A = L Lᵀ, in the lower triangle; null where A is not positive definite.
 * Source: A.-L. Cholesky's method as in G. H. Golub, C. F. Van Loan, Matrix Computations, § 4.2.
 */
export function choleskyFactor(matrix: Float64Array, n: number): Float64Array | null {
  const l = matrix.slice();
  for (let j = 0; j < n; j += 1) {
    const rowJ = j * n;
    const before = l[rowJ + j]!;
    let pivot = before;
    for (let k = 0; k < j; k += 1) {
      pivot -= l[rowJ + k]! * l[rowJ + k]!;
    }
    // What is left of a pivot after its digits cancelled is no sign of definiteness.
    if (!(pivot > 1e-14 * before)) {
      return null;
    }
    const root = Math.sqrt(pivot);
    l[rowJ + j] = root;
    for (let i = j + 1; i < n; i += 1) {
      const rowI = i * n;
      let value = l[rowI + j]!;
      for (let k = 0; k < j; k += 1) {
        value -= l[rowI + k]! * l[rowJ + k]!;
      }
      l[rowI + j] = value / root;
    }
  }
  return l;
}

/** Solves L Lᵀ x = b in place. */
export function choleskySolve(l: Float64Array, n: number, b: Float64Array): void {
  for (let i = 0; i < n; i += 1) {
    let value = b[i]!;
    for (let k = 0; k < i; k += 1) {
      value -= l[i * n + k]! * b[k]!;
    }
    b[i] = value / l[i * n + i]!;
  }
  for (let i = n - 1; i >= 0; i -= 1) {
    let value = b[i]!;
    for (let k = i + 1; k < n; k += 1) {
      value -= l[k * n + i]! * b[k]!;
    }
    b[i] = value / l[i * n + i]!;
  }
}

/** Eigenvalues in ascending order; vector k is row k of `vectors`, of unit length. */
export interface Eigensystem {
  readonly values: Float64Array;
  readonly vectors: Float64Array;
}

/**
 * Householder's reflections bring A to tridiagonal form, T = Q A Qᵀ; `q` starts as A and ends with
 * the rows of Q, so that row k of Q is the k-th basis vector.
 */
function tridiagonalise(a: Float64Array, n: number, diagonal: Float64Array, beside: Float64Array) {
  const q = new Float64Array(n * n);
  for (let i = 0; i < n; i += 1) {
    q[i * n + i] = 1;
  }
  const v = new Float64Array(n);
  const w = new Float64Array(n);
  for (let k = 0; k + 2 < n; k += 1) {
    let norm = 0;
    for (let i = k + 1; i < n; i += 1) {
      v[i] = a[i * n + k]!;
      norm += v[i]! * v[i]!;
    }
    const first = v[k + 1]!;
    // Nothing below the first entry: the column is in form already.
    if (norm - first * first <= 0) {
      beside[k] = first;
      continue;
    }
    const alpha = first > 0 ? -Math.sqrt(norm) : Math.sqrt(norm);
    v[k + 1] = first - alpha;
    const half = norm - first * alpha;
    reflectBothSides(a, n, k + 1, v, w, half);
    reflectRows(q, n, k + 1, v, w, half);
    beside[k] = alpha;
  }
  if (n > 1) {
    beside[n - 2] = a[(n - 1) * n + n - 2]!;
  }
  for (let i = 0; i < n; i += 1) {
    diagonal[i] = a[i * n + i]!;
  }
  return q;
}

/** A → H A H on the block from `start`, H = 1 − v vᵀ/half. */
function reflectBothSides(
  a: Float64Array,
  n: number,
  start: number,
  v: Float64Array,
  w: Float64Array,
  half: number,
): void {
  let along = 0;
  for (let i = start; i < n; i += 1) {
    let sum = 0;
    for (let j = start; j < n; j += 1) {
      sum += a[i * n + j]! * v[j]!;
    }
    w[i] = sum / half;
    along += w[i]! * v[i]!;
  }
  const shift = along / (2 * half);
  for (let i = start; i < n; i += 1) {
    w[i]! -= shift * v[i]!;
  }
  for (let i = start; i < n; i += 1) {
    const vi = v[i]!;
    const wi = w[i]!;
    for (let j = start; j < n; j += 1) {
      a[i * n + j]! -= vi * w[j]! + wi * v[j]!;
    }
  }
}

/** Q → H Q on the rows from `start`. */
function reflectRows(
  q: Float64Array,
  n: number,
  start: number,
  v: Float64Array,
  w: Float64Array,
  half: number,
): void {
  w.fill(0);
  for (let i = start; i < n; i += 1) {
    const vi = v[i]!;
    for (let j = 0; j < n; j += 1) {
      w[j]! += vi * q[i * n + j]!;
    }
  }
  for (let i = start; i < n; i += 1) {
    const vi = v[i]! / half;
    for (let j = 0; j < n; j += 1) {
      q[i * n + j]! -= vi * w[j]!;
    }
  }
}

/** Turns rows i and i + 1 of Q by an angle. */
function turnRows(q: Float64Array, n: number, i: number, c: number, s: number): void {
  const row = i * n;
  const next = row + n;
  for (let j = 0; j < n; j += 1) {
    const x = q[row + j]!;
    const y = q[next + j]!;
    q[row + j] = c * x + s * y;
    q[next + j] = c * y - s * x;
  }
}

/**
 * One implicit step on rows `low` … `high` of a tridiagonal matrix: a rotation with Wilkinson's
 * shift starts a bulge, and rotations down the diagonal chase it out.
 */
function chaseBulge(
  d: Float64Array,
  e: Float64Array,
  low: number,
  high: number,
  q: Float64Array,
  n: number,
): void {
  const delta = (d[high - 1]! - d[high]!) / 2;
  const last = e[high - 1]!;
  const root = Math.hypot(delta, last);
  const shift = d[high]! - (last * last) / (delta + (delta < 0 ? -root : root));
  let x = d[low]! - shift;
  let z = e[low]!;
  for (let k = low; k < high; k += 1) {
    const length = Math.hypot(x, z);
    const c = length === 0 ? 1 : x / length;
    const s = length === 0 ? 0 : z / length;
    if (k > low) {
      e[k - 1] = length;
    }
    const [a, b, f] = [d[k]!, d[k + 1]!, e[k]!];
    d[k] = c * c * a + 2 * c * s * f + s * s * b;
    d[k + 1] = s * s * a - 2 * c * s * f + c * c * b;
    e[k] = c * s * (b - a) + (c * c - s * s) * f;
    turnRows(q, n, k, c, s);
    if (k + 1 < high) {
      x = e[k]!;
      z = s * e[k + 1]!;
      e[k + 1] = c * e[k + 1]!;
    }
  }
}

/** Steps until every number beside the diagonal is below rounding. */
function diagonalise(d: Float64Array, e: Float64Array, q: Float64Array, n: number): void {
  let high = n - 1;
  let steps = 0;
  const isSmall = (k: number) =>
    Math.abs(e[k]!) <= Number.EPSILON * (Math.abs(d[k]!) + Math.abs(d[k + 1]!)) ||
    Math.abs(e[k]!) < 1e-300;
  while (high > 0) {
    if (isSmall(high - 1)) {
      high -= 1;
      continue;
    }
    let low = high - 1;
    while (low > 0 && !isSmall(low - 1)) {
      low -= 1;
    }
    chaseBulge(d, e, low, high, q, n);
    steps += 1;
    if (steps > 60 * n) {
      throw new RangeError('the eigenvalues of a matrix that is not finite were asked for');
    }
  }
}

/**
 * Eigenvalues and vectors of a symmetric matrix: Householder's tridiagonal form, then implicit QR
 * steps with Wilkinson's shift. Work about 9 n³.
 * Source: G. H. Golub, C. F. Van Loan, Matrix Computations, §§ 8.3.1 and 8.3.5.
 *
 * @throws RangeError if the matrix holds a number that is not finite
 */
export function symmetricEigensystem(matrix: Float64Array, n: number): Eigensystem {
  const d = new Float64Array(n);
  const e = new Float64Array(n);
  const q = tridiagonalise(matrix.slice(), n, d, e);
  diagonalise(d, e, q, n);
  const order = Array.from({ length: n }, (_, k) => k).sort((i, j) => d[i]! - d[j]!);
  const vectors = new Float64Array(n * n);
  order.forEach((from, to) => vectors.set(q.subarray(from * n, from * n + n), to * n));
  return { values: Float64Array.from(order, (k) => d[k]!), vectors };
}
