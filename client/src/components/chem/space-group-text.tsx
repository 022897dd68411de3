import { Fragment, type JSX } from 'react';

interface Token {
  kind: 'plain' | 'inverted' | 'screw';
  text: string;
}

/** Splits a Hermann–Mauguin symbol: `-3` is an inversion axis, `63` a screw axis. */
function tokenise(word: string): Token[] {
  const tokens: Token[] = [];
  for (const match of word.matchAll(/-(\d)|([2346])([1-5])|([^-\d]+|\d|-)/g)) {
    const [, inverted, axis, screw, plain] = match;
    if (inverted !== undefined) {
      tokens.push({ kind: 'inverted', text: inverted });
    } else if (axis !== undefined && screw !== undefined) {
      tokens.push({ kind: 'plain', text: axis }, { kind: 'screw', text: screw });
    } else if (plain !== undefined) {
      tokens.push({ kind: 'plain', text: plain });
    }
  }
  return tokens;
}

function Shown({ token }: { token: Token }): JSX.Element {
  switch (token.kind) {
    case 'inverted':
      return <span className="overline decoration-1">{token.text}</span>;
    case 'screw':
      return <sub className="leading-none">{token.text}</sub>;
    case 'plain':
      return <>{token.text}</>;
  }
}

/** How a symbol is read aloud: `F m bar 3 m`. */
function spoken(symbol: string): string {
  return symbol.replace(/-(\d)/g, 'bar $1');
}

/** A space-group symbol as tables set it: F m 3̄ m, P 6₃ m c. */
export function SpaceGroupText({ symbol }: { symbol: string }): JSX.Element {
  const words = symbol.trim().split(/\s+/);
  return (
    <span className="whitespace-nowrap">
      <span className="sr-only">{spoken(symbol)}</span>
      <span aria-hidden>
        {words.map((word, index) => (
          <Fragment key={index}>
            {index > 0 && ' '}
            {tokenise(word).map((token, at) => (
              <Shown key={at} token={token} />
            ))}
          </Fragment>
        ))}
      </span>
    </span>
  );
}
