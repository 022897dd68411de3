import { describe, expect, it } from 'vitest';

import { Problem } from '#common/errors/problem';

import { assertStrongPassword, passwordWeakness } from './password-rules.js';

const owner = { name: 'Mira Okafor', email: 'mira.okafor@kiln-lane.example' };

describe('passwordWeakness', () => {
  it.each([
    'short words',
    'aaaaaaaaaaaa',
    'abababababab',
    '123456789012',
    'qwertyuiop12',
    'Password1234!',
    'P4ssword2024!!',
    'passwordpassword',
    'iloveyou123456',
    'abcdefghijkl',
    'mirAokafor2024',
    'mira.okafor@kiln-lane',
    'Holdfast2024!',
    'administrator1',
    'welcome-welcome-1',
    '198404121984',
    '1qaz2wsx3edc',
    'lkjhgfdsalkjh',
  ])('finds %s weak', (password) => {
    expect(passwordWeakness(password, owner)).not.toBeNull();
  });

  it.each([
    'vermilion kettle orbit',
    'zq7!Kd92mVx#p',
    'grüne Ziegel trocknen langsam',
    'tide plover basalt',
    'Sommerregen auf Kupfer',
    'мой синий чайник поёт',
  ])('takes %s', (password) => {
    expect(passwordWeakness(password, owner)).toBeNull();
  });

  it('allows 64 characters and more (ASVS 6.2.9) of any kind (6.2.5)', () => {
    expect(passwordWeakness('river stone '.repeat(8), owner)).toBeNull();
  });

  it('names the field', () => {
    const check = () => assertStrongPassword('password1234', owner, 'newPassword');
    expect(check).toThrow(Problem);
    try {
      check();
    } catch (error) {
      expect((error as Problem).details?.fields).toMatchObject([{ field: 'newPassword' }]);
    }
  });
});
