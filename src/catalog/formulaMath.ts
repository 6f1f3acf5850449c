/**
 * The formula of a definition as MathML, undefined where it is told in words. The plain notation: juxtaposed factors,
 * `/`, `^`, `+`, `-`, `=`, round brackets, `sin`, `cos`, `tan`, names of Greek letters, `_` for what stands below; what follows ";", or a comma and words, explains
 * the symbols and is left out.
 */
export function formulaMath(formula: string): string | undefined {
  const tokens = tokensOf(equationsIn(formula));
  if (!tokens?.includes("=")) return undefined;
  const reader: Reader = { tokens, at: 0 };
  const math = equations(reader);
  if (math === undefined || reader.at < tokens.length) return undefined;
  return `<math xmlns="http://www.w3.org/1998/Math/MathML" display="block">${math}</math>`;
}

interface Reader {
  readonly tokens: readonly string[];
  at: number;
}

const greek: Readonly<Record<string, string>> = {
  delta: "\u03b4",
  eta: "\u03b7",
  gamma: "\u03b3",
  lambda: "\u03bb",
  nu: "\u03bd",
  omega: "\u03c9",
  phi: "\u03c6",
  pi: "\u03c0",
  sigma: "\u03c3",
};

/** Symbols of more than one letter; any other word means that the formula is told in words. */
const symbols: Readonly<Record<string, string>> = {
  dlambda: "<mi>\u0394\u03bb</mi>",
  dx: "<mi>\u0394x</mi>",
};

const namedFunctions = new Set(["sin", "cos", "tan"]);

/** A letter, Latin or Greek, alone or with what stands below it: `P`, `sigma_K`, `t_0`, `a_star`. */
function symbolOf(token: string): string | undefined {
  const [letter = "", below] = token.split("_");
  const base =
    symbols[token] ??
    (/^[A-Za-z]$/.test(letter) || letter in greek ? `<mi>${greek[letter] ?? letter}</mi>` : undefined);
  if (below === undefined || base === undefined) return base;
  const under =
    below === "star"
      ? "<mo>\u2217</mo>"
      : /^\d+$/.test(below)
        ? `<mn>${below}</mn>`
        : below.length === 1
          ? `<mi>${below}</mi>`
          : `<mi mathvariant="normal">${below}</mi>`;
  return `<msub>${base}${under}</msub>`;
}

/** The clauses up to the first that is none of symbols: ", solved exactly for m". */
function equationsIn(formula: string): string {
  const clauses = formula.split(";")[0]!.split(",");
  const words = clauses.findIndex((clause) => tokensOf(clause) === undefined);
  return clauses.slice(0, words < 0 ? clauses.length : words).join(",");
}

function tokensOf(text: string): readonly string[] | undefined {
  const tokens = text.match(/[A-Za-z]+(?:_[A-Za-z0-9]+)?|\d+(?:\.\d+)?|\S/g) ?? [];
  const isKnown = (token: string) =>
    /^\d+(?:\.\d+)?$|^[-+/^()=,]$/.test(token) || namedFunctions.has(token) || symbolOf(token) !== undefined;
  return tokens.every(isKnown) ? tokens : undefined;
}

/** `a = b = c`, and several of them after commas. */
function equations(reader: Reader): string | undefined {
  let math = sum(reader);
  while (math !== undefined && (peek(reader) === "=" || peek(reader) === ",")) {
    const operator = take(reader);
    const right = sum(reader);
    const space = operator === "," ? `<mo separator="true">,</mo><mspace width="1em"/>` : "<mo>=</mo>";
    math = right && `${math}${space}${right}`;
  }
  return math && `<mrow>${math}</mrow>`;
}

function sum(reader: Reader): string | undefined {
  const isNegative = peek(reader) === "-" && take(reader) === "-";
  const first = quotient(reader);
  let math = first && `${isNegative ? "<mo>\u2212</mo>" : ""}${first}`;
  while (math !== undefined && (peek(reader) === "+" || peek(reader) === "-")) {
    const sign = take(reader) === "-" ? "\u2212" : "+";
    const right = quotient(reader);
    math = right && `${math}<mo>${sign}</mo>${right}`;
  }
  return math;
}

/** What stands before "/" is the numerator, what stands behind it up to the next operator the denominator. */
function quotient(reader: Reader): string | undefined {
  let math = product(reader);
  while (math !== undefined && peek(reader) === "/") {
    take(reader);
    // Only one factor belongs to the denominator; more stand in brackets.
    const below = power(reader);
    math = below && `<mfrac><mrow>${bare(math)}</mrow><mrow>${bare(below)}</mrow></mfrac>`;
  }
  return math;
}

function product(reader: Reader): string | undefined {
  let math = power(reader);
  while (math !== undefined && startsFactor(peek(reader))) {
    const right = power(reader);
    math = right && `${math}<mo>\u2062</mo>${right}`;
  }
  return math;
}

function startsFactor(token: string | undefined): boolean {
  return token !== undefined && /^[A-Za-z\d(]/.test(token);
}

function power(reader: Reader): string | undefined {
  const base = primary(reader);
  if (base === undefined || peek(reader) !== "^") return base;
  take(reader);
  const exponent = primary(reader);
  if (exponent === undefined) return undefined;
  const inside = bare(exponent);
  const root = /^<mfrac><mrow><mn>1<\/mn><\/mrow><mrow><mn>(\d)<\/mn><\/mrow><\/mfrac>$/.exec(inside)?.[1];
  if (root === "2") return `<msqrt>${bare(base)}</msqrt>`;
  if (root !== undefined) return `<mroot><mrow>${bare(base)}</mrow><mn>${root}</mn></mroot>`;
  return `<msup>${base}<mrow>${inside}</mrow></msup>`;
}

function primary(reader: Reader): string | undefined {
  const token = take(reader);
  if (token === undefined) return undefined;
  if (token === "(") {
    const inside = sum(reader);
    return inside !== undefined && take(reader) === ")" ? `${open}${inside}${close}` : undefined;
  }
  if (/^[\d.]+$/.test(token)) return `<mn>${token}</mn>`;
  if (namedFunctions.has(token)) return applied(token, reader);
  if (!/^[A-Za-z]/.test(token)) return undefined;
  const symbol = symbolOf(token);
  if (symbol === undefined) return undefined;
  const isApplied = (token === "n" || token === "f") && peek(reader) === "(";
  const argument = isApplied ? primary(reader) : "";
  return argument === undefined
    ? undefined
    : argument === ""
      ? symbol
      : `<mrow>${symbol}<mo>\u2061</mo>${argument}</mrow>`;
}

/** `sin i`, `cos (nu + omega)`, `sin^2 omega`. */
function applied(name: string, reader: Reader): string | undefined {
  let head: string | undefined = `<mi>${name}</mi>`;
  if (peek(reader) === "^") {
    take(reader);
    const exponent = primary(reader);
    head = exponent && `<msup>${head}<mrow>${bare(exponent)}</mrow></msup>`;
  }
  const argument = head && power(reader);
  return argument && `<mrow>${head}<mo>\u2061</mo>${argument}</mrow>`;
}

const open = "<mrow><mo>(</mo>";
const close = "<mo>)</mo></mrow>";

/** Without the brackets that a fraction bar, a root or a raised place makes needless. */
function bare(math: string): string {
  if (!math.startsWith(open) || !math.endsWith(close)) return math;
  const inside = math.slice(open.length, -close.length);
  // The first bracket must close with the last: "(a)(b)" keeps both.
  let depth = 0;
  for (const [tag] of inside.matchAll(/<\/?mrow>/g)) {
    depth += tag === "<mrow>" ? 1 : -1;
    if (depth < 0) return math;
  }
  return inside;
}

function peek({ tokens, at }: Reader): string | undefined {
  return tokens[at];
}

function take(reader: Reader): string | undefined {
  return reader.tokens[reader.at++];
}
