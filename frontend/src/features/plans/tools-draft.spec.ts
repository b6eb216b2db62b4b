import { beforeEach, describe, expect, it } from 'vitest';
import { usualTools } from '@holdwater/shared-types/plans/plan-tools.js';
import { draftOfTools, keepTools, keptTools, readDraft } from './tools-draft';

const usual = usualTools();
const draft = draftOfTools(usual);

beforeEach(() => window.localStorage.clear());

describe('tools as typed', () => {
  it('are the usual ones when nothing is typed, or all is taken away again', () => {
    expect(readDraft(draft, usual).tools).toEqual(usual);
    const empty = { ...draft, rangePsi: '', incrementPsi: '', waterTempF: '', riserIn: '', maxSectionFt: '' };
    expect(readDraft(empty, usual).tools).toEqual(usual);
  });

  it('take a comma for a point', () => {
    expect(readDraft({ ...draft, fillRateGpm: '5,5' }, usual).tools?.fillRateGpm).toBe(5.5);
  });

  it.each([
    ['incrementPsi', '0', 'must-be-positive'],
    ['fillRateGpm', 'fast', 'must-be-a-number'],
    ['waterTempF', '20', 'water-temperature-out-of-range'],
    ['rangePsi', '', 'must-be-a-number'],
  ] as const)('name what is wrong with %s as %s', (field, typed, fault) => {
    const read = readDraft({ ...draft, [field]: typed }, usual);
    expect(read.tools).toBeNull();
    expect(read.faults[field]).toBe(fault);
  });

  it('go from lot to lot on this device, plugs excepted: those belong to the house', () => {
    const plugs = [{ name: 'a', elevationFt: 0, ratedPsi: 13, nominalIn: null }];
    keepTools({ ...usual, fillRateGpm: 7, plugs });
    expect(keptTools(usual)).toEqual({ ...usual, fillRateGpm: 7 });
  });

  it('are the usual ones where what is kept cannot be read', () => {
    window.localStorage.setItem('holdwater.plan-tools', '{"gauge":7}');
    expect(keptTools(usual)).toEqual(usual);
  });
});
