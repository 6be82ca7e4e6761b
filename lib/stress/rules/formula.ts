/**
 * The value of a rule's formula: numbers (a unit after a number is read over), names, `*`, `/`, `+`,
 * `-`, `sqrt( )` and parentheses; nothing else is run. null where it cannot be read.
 */
export function formulaValue(
  expression: string,
  values: ReadonlyMap<string, number>,
): number | null {
  const tokens = expression.match(/\d+(?:\.\d+)?(?:\s*[A-Z]\b)?|[A-Za-z]\w*|[()*/+-]/g) ?? [];
  let at = 0;
  const value = sum();
  return at === tokens.length && value !== null && Number.isFinite(value) ? value : null;

  function sum(): number | null {
    let left = product();
    while (left !== null && (tokens[at] === "+" || tokens[at] === "-")) {
      const sign = tokens[at++] === "+" ? 1 : -1;
      const right = product();
      left = right === null ? null : left + sign * right;
    }
    return left;
  }

  function product(): number | null {
    let left = factor();
    while (left !== null && (tokens[at] === "*" || tokens[at] === "/")) {
      const divide = tokens[at++] === "/";
      const right = factor();
      left = right === null ? null : divide ? left / right : left * right;
    }
    return left;
  }

  function factor(): number | null {
    const token = tokens[at++];
    if (token === undefined) return null;
    if (token === "(") return closed(sum());
    if (token === "sqrt" && tokens[at] === "(") {
      at += 1;
      const inside = closed(sum());
      return inside === null ? null : Math.sqrt(inside);
    }
    if (/^\d/.test(token)) return Number.parseFloat(token);
    return values.get(token) ?? null;
  }

  function closed(inside: number | null): number | null {
    return tokens[at++] === ")" ? inside : null;
  }
}
