import { describe, expect, it } from 'vitest';

import { addressForLog } from './logging.js';
import { newSecretToken } from './secret-token.js';

describe('addressForLog', () => {
  it('keeps no token and no query', () => {
    const token = newSecretToken();
    expect(addressForLog(`/api/invitations/${token}/accept`)).toBe('/api/invitations/…/accept');
    expect(addressForLog(`/api/shares/${token}?x=1`)).toBe('/api/shares/…');
  });

  it('keeps everything else', () => {
    expect(addressForLog('/api/workspaces/kiln-lane/lattices')).toBe(
      '/api/workspaces/kiln-lane/lattices',
    );
  });
});
