/** The named characters that tables of the trade hold (HTML standard, section 13.5); others stay as they stand. */
const named = new Map<string, string>(
  `amp & lt < gt > quot " apos ' plusmn ± minus − times × divide ÷ middot · sdot ⋅ deg ° micro µ permil ‰ prime ′ Prime ″
  ndash – mdash — hellip … lsquo ‘ rsquo ’ ldquo “ rdquo ” laquo « raquo » sup1 ¹ sup2 ² sup3 ³ frac12 ½ frac14 ¼ frac34 ¾
  odot ⊙ oplus ⊕ star ☆ starf ★ infin ∞ asymp ≈ sim ∼ le ≤ ge ≥ ne ≠ equiv ≡ prop ∝ radic √ copy © reg ® sect § para ¶
  dagger † Dagger ‡ bull • larr ← rarr → uarr ↑ darr ↓ euro € pound £ yen ¥ szlig ß auml ä ouml ö uuml ü Auml Ä Ouml Ö
  Uuml Ü eacute é egrave è ecirc ê agrave à aacute á acirc â ccedil ç ntilde ñ oacute ó iacute í aring å Aring Å oslash ø
  Oslash Ø aelig æ alpha α beta β gamma γ delta δ epsilon ε zeta ζ eta η theta θ iota ι kappa κ lambda λ mu μ nu ν xi ξ
  omicron ο pi π rho ρ sigma σ tau τ upsilon υ phi φ chi χ psi ψ omega ω Gamma Γ Delta Δ Theta Θ Lambda Λ Xi Ξ Pi Π
  Sigma Σ Phi Φ Psi Ψ Omega Ω`
    .split(/\s+/)
    .reduce<[string, string][]>((pairs, word, index, words) => {
      if (index % 2 === 1) {
        pairs.push([words[index - 1] as string, word]);
      }
      return pairs;
    }, []),
);
named.set("nbsp", "\u00A0").set("ensp", "\u2002").set("emsp", "\u2003").set("thinsp", "\u2009").set("shy", "\u00AD");

/** Numbers 128 to 159 mean the characters of windows-1252 (HTML standard, section 13.2.5.80). */
const windows = "€\u0081‚ƒ„…†‡ˆ‰Š‹Œ\u008DŽ\u008F\u0090‘’“”•–—˜™š›œ\u009DžŸ";

export function unescapeHtml(text: string): string {
  return text.includes("&")
    ? text.replace(/&(?:#x([0-9a-f]{1,6})|#(\d{1,7})|([a-z][a-z0-9]*));?/gi, (whole, hexadecimal, decimal, name) =>
        name === undefined
          ? characterOf(hexadecimal === undefined ? Number(decimal) : Number.parseInt(hexadecimal, 16))
          : (named.get(name) ?? whole),
      )
    : text;
}

function characterOf(code: number): string {
  if (code >= 0x80 && code <= 0x9f) {
    return windows[code - 0x80] as string;
  }
  const isCharacter = code > 0 && code <= 0x10ffff && !(code >= 0xd800 && code <= 0xdfff);
  return isCharacter ? String.fromCodePoint(code) : "\uFFFD";
}
