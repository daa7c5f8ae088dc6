/**
 * Vectors of 128 bits as T lanes: two of f64 or four of f32. One source serves both. Pointers and strides count bytes.
 * The compiler puts these small functions in place wherever they are called.
 */
export function add<T>(a: v128, b: v128): v128 {
  return v128.add<T>(a, b);
}

export function sub<T>(a: v128, b: v128): v128 {
  return v128.sub<T>(a, b);
}

export function mul<T>(a: v128, b: v128): v128 {
  return v128.mul<T>(a, b);
}

/** Real part of (a + jb)(c + js). */
export function productRe<T>(a: v128, b: v128, c: v128, s: v128): v128 {
  return v128.sub<T>(v128.mul<T>(a, c), v128.mul<T>(b, s));
}

/** Imaginary part of (a + jb)(c + js). */
export function productIm<T>(a: v128, b: v128, c: v128, s: v128): v128 {
  return v128.add<T>(v128.mul<T>(a, s), v128.mul<T>(b, c));
}

/** Stores the product of a + jb and c + js, its two parts at their two places. */
export function storeProduct<T>(re: usize, im: usize, a: v128, b: v128, c: v128, s: v128): void {
  v128.store(re, productRe<T>(a, b, c, s));
  v128.store(im, productIm<T>(a, b, c, s));
}

/** |a + jb|^2. */
export function powerOf<T>(a: v128, b: v128): v128 {
  return v128.add<T>(v128.mul<T>(a, a), v128.mul<T>(b, b));
}

/** Largest lane. */
export function largestLane<T>(a: v128): f64 {
  if (sizeof<T>() === 8) return max(f64x2.extract_lane(a, 0), f64x2.extract_lane(a, 1));
  const left = max(f32x4.extract_lane(a, 0), f32x4.extract_lane(a, 1));
  return <f64>max(left, max(f32x4.extract_lane(a, 2), f32x4.extract_lane(a, 3)));
}
