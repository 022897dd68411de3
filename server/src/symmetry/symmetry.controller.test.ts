import { describe, expect, it } from 'vitest';

import { spaceGroupDetail, spaceGroupList } from '#common/schemas/symmetry';

import { SymmetryController } from './symmetry.controller.js';

const controller = new SymmetryController();

describe('space groups over HTTP', () => {
  it('lists settings in the shape of the contract', () => {
    expect(spaceGroupList.parse(controller.list()).items).toHaveLength(530);
  });

  it('gives one with its operations', () => {
    const detail = spaceGroupDetail.parse(controller.get('523'));
    expect(detail.symbol).toBe('F m -3 m');
    expect(detail.operations).toHaveLength(192);
  });

  it('has nothing beyond 530', () => {
    expect(() => controller.get('531')).toThrow(
      expect.objectContaining({ code: 'space_group.not_found' }),
    );
  });
});
