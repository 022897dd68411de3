import { Problem } from '#common/errors/problem';
import { passwordLimits } from '#common/schemas/auth';

import { commonPasswordWords } from './common-passwords.js';

export interface PasswordOwner {
  readonly name: string;
  readonly email: string;
}

const sequences = [
  'abcdefghijklmnopqrstuvwxyz',
  '01234567890123456789',
  'qwertyuiop',
  'qwertzuiop',
  'azertyuiop',
  'asdfghjkl',
  'zxcvbnm',
  '1qaz2wsx3edc4rfv5tgb6yhn7ujm',
];

/** Runs along the alphabet, the digits or a keyboard row that are long enough to count. */
const sequenceLength = 4;

/** Words that say something about the product rather than the person. */
const productWords = ['holdfast'];

const plain = (text: string): string => text.normalize('NFKC').toLowerCase();

const hasSequenceAt = (text: string, at: number, length: number): boolean => {
  const piece = text.slice(at, at + length);
  const back = [...piece].reverse().join('');
  return (
    piece.length === length &&
    sequences.some((sequence) => sequence.includes(piece) || sequence.includes(back))
  );
};

/** The text without runs such as `12345` or `lkjh`. */
function withoutSequences(text: string): string {
  let rest = '';
  for (let at = 0; at < text.length;) {
    let length = 0;
    while (hasSequenceAt(text, at, Math.max(length + 1, sequenceLength))) {
      length = Math.max(length + 1, sequenceLength);
    }
    rest += length === 0 ? text[at] : '';
    at += Math.max(length, 1);
  }
  return rest;
}

const withoutWords = (text: string, words: readonly string[]): string =>
  [...words]
    .sort((a, b) => b.length - a.length)
    .reduce((rest, word) => rest.split(word).join(''), text);

/** Words a guesser who knows the person would try. */
const wordsAbout = ({ name, email }: PasswordOwner): string[] =>
  `${plain(name)} ${plain(email)}`.split(/[^\p{L}\p{N}]+/u).filter((word) => word.length >= 3);

/** Fewest different characters, and characters left once all that is guessable is taken out. */
const fewestDifferent = 5;
const fewestLeft = 6;
/** Fewest characters of a password without a letter: shorter ones are dates and telephone numbers. */
const fewestWithoutLetters = 16;

/** Why a password is easily guessed and what to do, or null when it is not. */
export function passwordWeakness(password: string, owner: PasswordOwner): string | null {
  const text = plain(password);
  if ([...password].length < passwordLimits.minLength) {
    return `Use at least ${passwordLimits.minLength} characters.`;
  }
  if (new Set(text).size < fewestDifferent) {
    return 'Use more different characters.';
  }
  const about = withoutWords(text, [...productWords, ...wordsAbout(owner)]);
  if (about.length < fewestLeft) {
    return 'Leave your name, your address and the product’s name out of it.';
  }
  const rest = withoutSequences(withoutWords(about, commonPasswordWords)).replace(
    /[^\p{L}]/gu,
    (sign, at: number, whole: string) => (whole[at - 1] === sign ? '' : sign),
  );
  const letters = rest.replace(/[^\p{L}]/gu, '');
  return rest.length < fewestLeft || (letters === '' && rest.length < fewestWithoutLetters)
    ? 'This is among the first that guessers try. Several unrelated words make a good one.'
    : null;
}

/**
 * @param field the field of the request the password stands in
 * @throws {Problem} `auth.weak_password`, naming the field and how to mend it
 */
export function assertStrongPassword(password: string, owner: PasswordOwner, field: string): void {
  const weakness = passwordWeakness(password, owner);
  if (weakness !== null) {
    throw new Problem('auth.weak_password', weakness, {
      fields: [{ code: 'auth.weak_password', field, message: weakness }],
    });
  }
}
