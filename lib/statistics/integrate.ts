export type Integral = { kind: 'found'; value: number; error: number } | { kind: 'notConverged' };

const nodes = [
  0.991455371120812639206854697526329, 0.949107912342758524526189684047851, 0.864864423359769072789712788640926,
  0.741531185599394439863864773280788, 0.586087235467691130294144691693013, 0.405845151377397166906606412076961,
  0.207784955007898467600689403773245,
];
const kronrod = [
  0.022935322010529224963732008058969, 0.063092092629978553290700663189204, 0.104790010322250183839876322541518,
  0.140653259715525918745189590510238, 0.16900472663926790282829543364256, 0.190350578064785409913256402421014,
  0.204432940075298892414161999234649,
];
const kronrodCentre = 0.209482141084727828012999174891714;
const gauss = [
  0.129484966168869693270611432679082, 0.27970539148927666790146777142378, 0.381830050505118944950369775488975,
];
const gaussCentre = 0.417959183673469387755102040816327;

const mostPanels = 400;

interface Panel {
  from: number;
  to: number;
  value: number;
  error: number;
}

/**
 * Integral of `f` over the finite range `from` to `to`, begun on the panels that `breaks` divide it into (put them where f
 * bends). Gauss and Kronrod of 7 and 15 points, the worst panel halved until the error estimates add up to less than
 * `tolerance` (absolute, in the unit of the integral). QUADPACK (Piessens et al., 1983), QAG.
 */
export function integrate(
  f: (x: number) => number,
  from: number,
  to: number,
  tolerance: number,
  breaks: readonly number[] = [],
): Integral {
  const ends = [from, ...breaks.filter((x) => x > from && x < to).sort((a, b) => a - b), to];
  const panels = ends.slice(1).map((end, i) => panel(f, ends[i]!, end));
  while (panels.length < mostPanels) {
    const error = panels.reduce((sum, p) => sum + p.error, 0);
    if (Number.isNaN(error)) return { kind: 'notConverged' };
    if (error <= tolerance) return { kind: 'found', value: panels.reduce((sum, p) => sum + p.value, 0), error };
    const worst = panels.reduce((at, p, i) => (p.error > panels[at]!.error ? i : at), 0);
    const [{ from: low, to: high }] = panels.splice(worst, 1) as [Panel];
    panels.push(panel(f, low, (low + high) / 2), panel(f, (low + high) / 2, high));
  }
  return { kind: 'notConverged' };
}

function panel(f: (x: number) => number, from: number, to: number): Panel {
  const centre = (from + to) / 2;
  const half = (to - from) / 2;
  const atCentre = f(centre);
  let fine = kronrodCentre * atCentre;
  let coarse = gaussCentre * atCentre;
  nodes.forEach((node, i) => {
    const pair = f(centre - half * node) + f(centre + half * node);
    fine += kronrod[i]! * pair;
    if (i % 2 === 1) coarse += gauss[(i - 1) / 2]! * pair;
  });
  return { from, to, value: half * fine, error: Math.abs(half * (fine - coarse)) };
}
