/**
 * How near to a half counts as one. A size that came as hundredths of a millimetre moves, at 16 ft, a surface
 * measure by under 0.0003 ft2; a real difference of 1/64 in moves it by 0.001 even at 1 ft.
 */
const tie = 0.0005;

/**
 * Rounding to whole numbers as tallies do it: to the nearest, exact halves alternately up and down, up first. AHEC for
 * half inches of width [confirmed]; NHLA Measurement & Tally for half feet of surface measure [memory]. Make one for each
 * run of boards that is tallied together; it remembers only which way the last half went.
 */
export function alternatingRounder(): (value: number) => number {
  let up = false;
  return (value) => {
    const below = Math.floor(value);
    if (Math.abs(value - below - 0.5) > tie) return Math.round(value);
    up = !up;
    return up ? below + 1 : below;
  };
}
