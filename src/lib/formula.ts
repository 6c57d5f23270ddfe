/** Chemical formulas as the trade writes them: `Si`, `Al2O3`, `Si0.8Ge0.2`, `Ba8Ga16Ge30`, `Ca(OH)2`. */

const elementSymbols = new Set(
  (
    'H He Li Be B C N O F Ne Na Mg Al Si P S Cl Ar K Ca Sc Ti V Cr Mn Fe Co Ni Cu Zn Ga Ge As Se Br Kr Rb Sr Y Zr Nb Mo ' +
    'Tc Ru Rh Pd Ag Cd In Sn Sb Te I Xe Cs Ba La Ce Pr Nd Pm Sm Eu Gd Tb Dy Ho Er Tm Yb Lu Hf Ta W Re Os Ir Pt Au Hg Tl ' +
    'Pb Bi Po At Rn Fr Ra Ac Th Pa U Np Pu Am Cm Bk Cf Es Fm Md No Lr Rf Db Sg Bh Hs Mt Ds Rg Cn Nh Fl Mc Lv Ts Og'
  ).split(' '),
);

export interface FormulaPart {
  readonly element: string;
  /** Atoms per formula unit; need not be whole. */
  readonly count: number;
}

export function isElementSymbol(text: string): boolean {
  return elementSymbols.has(text);
}

/**
 * Reads a formula into its elements, in the order in which they first stand, repeated ones added up.
 * @throws RangeError that quotes the formula and says where it cannot be read.
 */
export function parseFormula(formula: string): readonly FormulaPart[] {
  const groups: Map<string, number>[] = [new Map<string, number>()];
  const token = /([A-Z][a-z]?)(\d+(?:\.\d+)?)?|(\()|(\))(\d+(?:\.\d+)?)?/y;
  while (token.lastIndex < formula.length) {
    const at = token.lastIndex;
    const match = token.exec(formula);
    if (match === null) throw unreadable(formula, at, 'expected an element symbol or a parenthesis');
    const [, element, count, opening, closing, times] = match;
    if (element !== undefined) addAtoms(groups, element, multiplier(formula, at, count), { formula, at });
    else if (opening !== undefined) groups.push(new Map<string, number>());
    else if (closing !== undefined) closeGroup(groups, multiplier(formula, at, times), { formula, at });
  }
  const [whole, ...open] = groups;
  if (open.length > 0) throw unreadable(formula, formula.length, 'a parenthesis is not closed');
  if (whole === undefined || whole.size === 0) throw unreadable(formula, 0, 'it names no element');
  return [...whole].map(([element, count]) => ({ element, count }));
}

interface Place {
  readonly formula: string;
  readonly at: number;
}

function addAtoms(
  groups: readonly Map<string, number>[],
  element: string,
  count: number,
  place: Place,
): void {
  if (!elementSymbols.has(element))
    throw unreadable(place.formula, place.at, `there is no element "${element}"`);
  const group = groups.at(-1);
  group?.set(element, (group.get(element) ?? 0) + count);
}

function closeGroup(groups: Map<string, number>[], times: number, place: Place): void {
  const inner = groups.pop();
  if (inner === undefined || groups.length === 0) {
    throw unreadable(place.formula, place.at, 'a parenthesis closes that was never opened');
  }
  for (const [element, count] of inner) addAtoms(groups, element, count * times, place);
}

function multiplier(formula: string, at: number, text: string | undefined): number {
  const value = text === undefined ? 1 : Number(text);
  if (value > 0) return value;
  throw unreadable(formula, at, 'a count of zero');
}

function unreadable(formula: string, at: number, reason: string): RangeError {
  return new RangeError(`The formula "${formula}" cannot be read at character ${at + 1}: ${reason}.`);
}
