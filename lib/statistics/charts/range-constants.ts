/** Mean and standard deviation of the range of n = 2 to 50 standard normal values, by integration in R 4.2.2. */
const ofRange: readonly (readonly [number, number])[] = [
  [1.128379167, 0.852502466],
  [1.692568751, 0.888368004],
  [2.058750746, 0.879808203],
  [2.325928947, 0.864081941],
  [2.534412721, 0.848039686],
  [2.704356751, 0.833205336],
  [2.847200612, 0.81983149],
  [2.970026324, 0.807834275],
  [3.077505462, 0.797050674],
  [3.172872704, 0.787314621],
  [3.25845528, 0.778478341],
  [3.335980354, 0.770416202],
  [3.406763108, 0.763023096],
  [3.47182689, 0.75621143],
  [3.531982786, 0.749908089],
  [3.587883962, 0.744051784],
  [3.640063758, 0.738590853],
  [3.688963023, 0.733481496],
  [3.73495012, 0.728686346],
  [3.77833583, 0.724173341],
  [3.819384643, 0.719914808],
  [3.858323423, 0.715886735],
  [3.895348148, 0.712068175],
  [3.93062922, 0.708440766],
  [3.96431568, 0.704988338],
  [3.996538604, 0.701696589],
  [4.027413848, 0.698552817],
  [4.057044292, 0.695545698],
  [4.085521688, 0.692665099],
  [4.112928195, 0.689901921],
  [4.139337656, 0.687247967],
  [4.164816672, 0.684695833],
  [4.189425512, 0.682238807],
  [4.213218879, 0.679870791],
  [4.236246574, 0.677586229],
  [4.258554051, 0.675380047],
  [4.28018291, 0.673247599],
  [4.301171315, 0.671184623],
  [4.321554356, 0.6691872],
  [4.34136437, 0.667251719],
  [4.360631215, 0.665374847],
  [4.379382521, 0.6635535],
  [4.397643897, 0.661784824],
  [4.415439128, 0.660066168],
  [4.432790336, 0.658395067],
  [4.449718135, 0.656769227],
  [4.466241762, 0.655186511],
  [4.482379194, 0.65364492],
  [4.498147259, 0.652142588],
];

/**
 * d2 and d3: mean and standard deviation of the range of `n` independent normal values, in standard deviations. Whole `n`
 * from 2 to 50; throws outside. L. H. C. Tippett, Biometrika 17 (1925); NIST/SEMATECH e-Handbook 6.3.2.1.
 */
export function rangeConstants(n: number): { d2: number; d3: number } {
  const row = ofRange[n - 2];
  if (!row) throw new RangeError(`Constants of the range are known for 2 to 50 values, not for ${n}.`);
  return { d2: row[0], d3: row[1] };
}

/**
 * d2*: what divides the mean range of `groups` samples of `n` so that its square is unbiased for the variance, sqrt(d2² +
 * d3²/groups). The factors K1, K2, K3 of the average-and-range method are 1/d2*. A. J. Duncan, Industrial Quality Control 11 (1955).
 */
export function rangeDivisor(n: number, groups: number): number {
  const { d2, d3 } = rangeConstants(n);
  return Math.sqrt(d2 * d2 + (d3 * d3) / groups);
}
