/** A piece of a formula: text, something raised or lowered, or a fraction. */
export type FormulaPart =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'raised' | 'lowered'; readonly parts: readonly FormulaPart[] }
  | {
      readonly kind: 'fraction';
      readonly above: readonly FormulaPart[];
      readonly below: readonly FormulaPart[];
    };

interface Reader {
  readonly text: string;
  at: number;
}

function readGroup(reader: Reader): FormulaPart[] {
  if (reader.text[reader.at] === '{') {
    reader.at += 1;
    const parts = readUntil(reader, '}');
    reader.at += 1;
    return parts;
  }
  reader.at += 1;
  return [{ kind: 'text', text: reader.text[reader.at - 1] ?? '' }];
}

function readFraction(reader: Reader): FormulaPart {
  reader.at += 1;
  const above = readUntil(reader, '¦');
  reader.at += 1;
  const below = readUntil(reader, ']');
  reader.at += 1;
  return { kind: 'fraction', above, below };
}

function readUntil(reader: Reader, end: string): FormulaPart[] {
  const parts: FormulaPart[] = [];
  let text = '';
  const keep = () => {
    if (text !== '') {
      parts.push({ kind: 'text', text });
      text = '';
    }
  };
  while (reader.at < reader.text.length && reader.text[reader.at] !== end) {
    const sign = reader.text[reader.at]!;
    if (sign === '_' || sign === '^') {
      keep();
      reader.at += 1;
      parts.push({ kind: sign === '^' ? 'raised' : 'lowered', parts: readGroup(reader) });
    } else if (sign === '[') {
      keep();
      parts.push(readFraction(reader));
    } else {
      text += sign;
      reader.at += 1;
    }
  }
  keep();
  return parts;
}

/** Reads `k_e`, `s^{−n}`, `[above¦below]`. */
export function formulaParts(text: string): FormulaPart[] {
  return readUntil({ text, at: 0 }, '');
}

/** The formula on one line, for reading aloud. */
export function formulaLine(parts: readonly FormulaPart[]): string {
  return parts
    .map((part) => {
      switch (part.kind) {
        case 'text':
          return part.text;
        case 'raised':
          return ` to the power ${formulaLine(part.parts)}`;
        case 'lowered':
          return ` ${formulaLine(part.parts)}`;
        case 'fraction':
          return `(${formulaLine(part.above)}) over (${formulaLine(part.below)})`;
      }
    })
    .join('');
}
