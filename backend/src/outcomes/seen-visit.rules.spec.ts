import { randomUUID } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import type { AppError } from '../common/errors/app-error.js';
import { ruleCardContent } from '../testing/fixtures/rule-card-content.js';
import type { LotCorrection, SeenResult, SeenVisit } from './outcome.input.js';
import { decideSeen } from './seen-visit.rules.js';

const stage = ruleCardContent().stages.find((each) => each.code === 'rough-in');
if (!stage) throw new Error('the fixture has a rough-in');

type NewCorrection = SeenResult['corrections'][number];
const correction = (parts: Partial<NewCorrection> = {}): NewCorrection => ({
  clientId: randomUUID(),
  unitNumber: 1,
  subject: 'dwv',
  text: 'Leak at the tee',
  place: 'whole-system',
  severity: 'fix-before-cover',
  ...parts,
});
const earlier = (parts: Partial<LotCorrection> = {}): LotCorrection => ({
  id: randomUUID(),
  number: 1,
  unitNumber: 1,
  stageCode: 'rough-in',
  subject: 'dwv',
  severity: 'fix-before-cover',
  state: 'fixed',
  ...parts,
});
const answers = (dwv: 'pass' | 'fail' | 'not-seen', water: 'pass' | 'fail' | 'not-seen'): SeenResult['systems'] => [
  { unitNumber: 1, system: 'dwv', answer: dwv },
  { unitNumber: 1, system: 'water', answer: water },
];
const seen = (parts: Partial<SeenResult> = {}): SeenResult => ({
  kind: 'seen',
  systems: answers('pass', 'pass'),
  lookedAt: [],
  corrections: [],
  accepted: [],
  reopened: [],
  ...parts,
});
const visit = (...corrections: LotCorrection[]): SeenVisit => ({ stage, unitNumbers: [1], corrections });

function refusal(act: () => unknown): Pick<AppError, 'code' | 'params' | 'fields'> {
  try {
    act();
  } catch (error) {
    return error as AppError;
  }
  throw new Error('was not refused');
}

describe('what a seen visit comes to', () => {
  it.each<[string, SeenResult, SeenVisit, object]>([
    ['passes when all passed', seen(), visit(), { kind: 'pass', reason: null }],
    [
      'fails with a system',
      seen({ systems: answers('fail', 'pass'), corrections: [correction()] }),
      visit(),
      { kind: 'fail', reason: null },
    ],
    [
      'fails for what was not seen',
      seen({ systems: answers('pass', 'not-seen') }),
      visit(),
      { kind: 'fail', reason: 'not-seen' },
    ],
    [
      'fails with the work',
      seen({ corrections: [correction({ subject: 'work' })] }),
      visit(),
      { kind: 'fail', reason: null },
    ],
    [
      'passes with work to fix later, and with a note',
      seen({
        corrections: [
          correction({ subject: 'work', severity: 'fix-before-final' }),
          correction({ subject: 'dwv', severity: 'note' }),
        ],
      }),
      visit(),
      { kind: 'pass', reason: null },
    ],
  ])('%s', (_what, result, of, decision) => {
    expect(decideSeen(result, of)).toEqual(decision);
  });

  it('fails with work that is reopened', () => {
    const work = earlier({ subject: 'work' });
    expect(decideSeen(seen({ reopened: [{ correctionId: work.id, why: 'still bare' }] }), visit(work))).toEqual({
      kind: 'fail',
      reason: null,
    });
    expect(decideSeen(seen({ accepted: [work.id] }), visit(work)).kind).toBe('pass');
  });

  it('fails a system whose correction is reopened, without a new one', () => {
    const fixed = earlier();
    const result = seen({ systems: answers('fail', 'pass'), reopened: [{ correctionId: fixed.id, why: 'drips' }] });
    expect(decideSeen(result, visit(fixed)).kind).toBe('fail');
  });

  it('leaves alone what belongs to another stage or unit', () => {
    const others = [earlier({ stageCode: 'groundwork', state: 'open' }), earlier({ unitNumber: 2, state: 'open' })];
    expect(decideSeen(seen(), visit(...others)).kind).toBe('pass');
  });
});

describe('what is refused', () => {
  it('a required system without an answer, each named', () => {
    const two = { ...visit(), unitNumbers: [1, 2] };
    expect(refusal(() => decideSeen(seen({ systems: answers('pass', 'pass').slice(0, 1) }), two))).toMatchObject({
      code: 'answers-missing',
      params: {
        missing: [
          { unitNumber: 1, system: 'water' },
          { unitNumber: 2, system: 'dwv' },
          { unitNumber: 2, system: 'water' },
        ],
      },
      fields: {
        'result.systems.1.water': 'required',
        'result.systems.2.dwv': 'required',
        'result.systems.2.water': 'required',
      },
    });
  });

  it.each<[string, Partial<NewCorrection>[]]>([
    ['none', []],
    ['one on the other system', [{ subject: 'water' }]],
    ['one on the work', [{ subject: 'work' }]],
  ])('a failed system with %s', (_what, given) => {
    const result = seen({
      systems: answers('fail', 'fail'),
      corrections: [...given.map(correction), correction({ subject: 'water' })],
    });
    expect(refusal(() => decideSeen(result, visit()))).toMatchObject({
      code: 'fail-needs-a-correction',
      params: { systems: [{ unitNumber: 1, system: 'dwv' }] },
      fields: { 'result.systems.0.answer': 'needs-a-correction' },
    });
  });

  it('a failed system of one unit with a correction on another', () => {
    const systems = [
      ...answers('fail', 'pass'),
      ...answers('pass', 'pass').map((each) => ({ ...each, unitNumber: 2 })),
    ];
    const result = seen({ systems, corrections: [correction({ unitNumber: 2, severity: 'note' })] });
    expect(refusal(() => decideSeen(result, { ...visit(), unitNumbers: [1, 2] })).code).toBe('fail-needs-a-correction');
  });

  it('a pass over a correction to fix before cover: a new one, a reopened one, one still open', () => {
    const fixed = earlier();
    const over: Array<[SeenResult, SeenVisit]> = [
      [seen({ corrections: [correction()] }), visit()],
      [seen({ reopened: [{ correctionId: fixed.id, why: 'drips' }] }), visit(fixed)],
      [seen(), visit(earlier({ state: 'open' }))],
    ];
    for (const [result, of] of over) {
      expect(refusal(() => decideSeen(result, of))).toMatchObject({
        code: 'pass-with-open-correction',
        fields: { 'result.systems.0.answer': 'has-a-correction' },
      });
    }
  });

  it.each(['open', 'accepted'] as const)('accepting or reopening one that is %s', (state) => {
    const one = earlier({ state, number: 7 });
    expect(refusal(() => decideSeen(seen({ accepted: [one.id] }), visit(one)))).toMatchObject({
      code: 'correction-unfixed',
      params: { number: 7, is: state },
    });
    const reopened = [{ correctionId: one.id, why: 'no' }];
    expect(refusal(() => decideSeen(seen({ reopened }), visit(one))).code).toBe('correction-unfixed');
  });

  it('whatever is not of this visit, all of it at once', () => {
    const twice = correction({ unitNumber: 3, pointCode: 'no-such-point' });
    const fixed = earlier();
    const result = seen({
      systems: [
        ...answers('pass', 'pass'),
        { unitNumber: 1, system: 'water', answer: 'fail' },
        { unitNumber: 2, system: 'dwv', answer: 'pass', levelIn: 1, pressurePsi: 2 },
        { unitNumber: 4, system: 'water', answer: 'pass', levelIn: 1 },
      ],
      lookedAt: ['supports', 'no-such-point'],
      corrections: [twice, { ...twice, unitNumber: 1, pointCode: 'supports' }],
      accepted: [randomUUID(), fixed.id],
      reopened: [{ correctionId: fixed.id, why: 'both' }],
    });
    expect(refusal(() => decideSeen(result, visit(fixed)))).toMatchObject({
      code: 'bad-input',
      fields: {
        'result.systems.2': 'named-twice',
        'result.systems.3.unitNumber': 'not-of-this-visit',
        'result.systems.3.levelIn': 'level-or-pressure',
        'result.systems.4.unitNumber': 'not-of-this-visit',
        'result.systems.4.levelIn': 'not-for-a-gauge',
        'result.lookedAt.1': 'unknown-point',
        'result.corrections.0.unitNumber': 'not-of-this-visit',
        'result.corrections.0.pointCode': 'unknown-point',
        'result.corrections.1.clientId': 'named-twice',
        'result.accepted.0': 'unknown-correction',
        'result.reopened.0.correctionId': 'named-twice',
      },
    });
  });

  it('a system or a subject the stage does not have', () => {
    const groundwork = ruleCardContent().stages[0];
    if (!groundwork) throw new Error('the fixture has a groundwork');
    const result = seen({ corrections: [correction({ subject: 'water' })] });
    expect(refusal(() => decideSeen(result, { ...visit(), stage: groundwork })).fields).toEqual({
      'result.systems.1.system': 'not-of-this-stage',
      'result.corrections.0.subject': 'not-of-this-stage',
    });
  });
});
