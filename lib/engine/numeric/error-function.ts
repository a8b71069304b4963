/**
 * Error function and its complement in double precision (relative error below 1e-15 where the result is normal), by the
 * rational approximations of the FreeBSD mathematics library (s_erf.c, Sun Microsystems 1993).
 */

const EFX = 1.28379167095512586316e-1;
const ERX = 8.45062911510467529297e-1;

const PP = [
  1.28379167095512558561e-1, -3.2504210724700149937e-1, -2.84817495755985104766e-2,
  -5.77027029648944159157e-3, -2.37630166566501626084e-5,
];
const QQ = [
  1, 3.97917223959155352819e-1, 6.50222499887672944485e-2, 5.08130628187576562776e-3,
  1.32494738004321644526e-4, -3.9602282787753681232e-6,
];
const PA = [
  -2.36211856075265944077e-3, 4.14856118683748331666e-1, -3.72207876035701323847e-1,
  3.18346619901161753674e-1, -1.10894694282396677476e-1, 3.54783043256182359371e-2, -2.166375594868790843e-3,
];
const QA = [
  1, 1.06420880400844228286e-1, 5.40397917702171048937e-1, 7.18286544141962662868e-2,
  1.26171219808761642112e-1, 1.36370839120290507362e-2, 1.1984499846799107417e-2,
];
const RA = [
  -9.86494403484714822705e-3, -6.93858572707181764372e-1, -1.05586262253232909814e1,
  -6.23753324503260060396e1, -1.62396669462573470355e2, -1.84605092906711035994e2, -8.12874355063065934246e1,
  -9.81432934416914548592,
];
const SA = [
  1, 1.96512716674392571292e1, 1.376577541435190426e2, 4.34565877475229228821e2, 6.45387271733267880336e2,
  4.29008140027567833386e2, 1.08635005541779435134e2, 6.57024977031928170135, -6.04244152148580987438e-2,
];
const RB = [
  -9.86494292470009928597e-3, -7.99283237680523006574e-1, -1.77579549177547519889e1,
  -1.60636384855821916062e2, -6.37566443368389627722e2, -1.02509513161107724954e3, -4.83519191608651397019e2,
];
const SB = [
  1, 3.03380607434824582924e1, 3.25792512996573918826e2, 1.53672958608443695994e3, 3.19985821950859553908e3,
  2.55305040643316442583e3, 4.74528541206955367215e2, -2.24409524465858183362e1,
];

function horner(coefficients: readonly number[], x: number): number {
  let sum = 0;
  for (let i = coefficients.length - 1; i >= 0; i--) sum = sum * x + coefficients[i];
  return sum;
}

/** erfc for x ≥ 1.25, without the cancellation of 1 − erf. */
function tail(x: number): number {
  const s = 1 / (x * x);
  const ratio = x < 1 / 0.35 ? horner(RA, s) / horner(SA, s) : horner(RB, s) / horner(SB, s);
  // x² is split so that exp sees an exact square and a small rest.
  const z = Math.fround(x);
  return (Math.exp(-z * z - 0.5625) * Math.exp((z - x) * (z + x) + ratio)) / x;
}

/** The error function, odd, between −1 and 1. */
export function erf(x: number): number {
  if (Number.isNaN(x)) return Number.NaN;
  const size = Math.abs(x);
  if (size < 0.84375) {
    if (size < 3.7252902984e-9) return x + EFX * x;
    const z = x * x;
    return x + (x * horner(PP, z)) / horner(QQ, z);
  }
  if (size >= 6) return Math.sign(x);
  if (size < 1.25) {
    const s = size - 1;
    return Math.sign(x) * (ERX + horner(PA, s) / horner(QA, s));
  }
  return Math.sign(x) * (1 - tail(size));
}

/** The complementary error function 1 − erf(x), with full relative precision far out; 0 beyond about 27. */
export function erfc(x: number): number {
  if (Number.isNaN(x)) return Number.NaN;
  const size = Math.abs(x);
  if (size < 0.84375) {
    if (size < 1.3877787807814457e-17) return 1 - x;
    const z = x * x;
    const y = horner(PP, z) / horner(QQ, z);
    if (x < 0.25) return 1 - (x + x * y);
    return 0.5 - (x - 0.5 + x * y);
  }
  if (size < 1.25) {
    const s = size - 1;
    const ratio = horner(PA, s) / horner(QA, s);
    return x >= 0 ? 1 - ERX - ratio : 1 + (ERX + ratio);
  }
  if (x <= -6) return 2;
  if (x >= 28) return 0;
  return x > 0 ? tail(size) : 2 - tail(size);
}
