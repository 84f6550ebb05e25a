import { describe, expect, it } from 'vitest';
import { diffContent } from '../../../shared/domain/diffContent';

const before = {
  specimen: { code: 'A', sex: null },
  structures: [
    { id: 'one', mass: { text: '1', unit: 'g' }, samples: [{ id: 'x', aliquots: [{ nuclei: '10' }, { nuclei: '12' }] }] },
    { id: 'two', mass: { text: '2', unit: 'g' }, samples: [] },
  ],
};

describe('what a revision changes', () => {
  it('is nothing between equal contents', () => {
    expect(diffContent(before, structuredClone(before))).toEqual([]);
  });

  it('names each changed leaf with both texts', () => {
    const after = structuredClone(before);
    after.specimen.code = 'B';
    after.structures[0]!.samples[0]!.aliquots[1]!.nuclei = '21';
    expect(diffContent(before, after)).toEqual([
      { path: 'specimen.code', before: 'A', after: 'B' },
      { path: 'structures.0.samples.0.aliquots.1.nuclei', before: '12', after: '21' },
    ]);
  });

  it('follows an entry by its id when another is put before it', () => {
    const after = { ...before, structures: [{ id: 'new', mass: { text: '', unit: 'g' }, samples: [] }, ...before.structures] };
    expect(diffContent(before, after)).toEqual([{ path: 'structures.0.mass.unit', before: '', after: 'g' }]);
  });

  it('lists what an entry held that is gone, with its former place', () => {
    const after = { ...before, structures: before.structures.slice(1) };
    expect(diffContent(before, after).map((change) => [change.path, change.before, change.after])).toEqual([
      ['structures.0.mass.text', '1', ''],
      ['structures.0.mass.unit', 'g', ''],
      ['structures.0.samples.0.aliquots.0.nuclei', '10', ''],
      ['structures.0.samples.0.aliquots.1.nuclei', '12', ''],
    ]);
  });

  it('writes a choice made where none was', () => {
    expect(diffContent({ sex: null, accepted: false }, { sex: 'female', accepted: true })).toEqual([
      { path: 'sex', before: '', after: 'female' },
      { path: 'accepted', before: 'no', after: 'yes' },
    ]);
  });
});
