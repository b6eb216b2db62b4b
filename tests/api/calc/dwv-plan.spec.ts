import { describe, expect, it } from 'vitest';
import { dwvInputs } from './inputs/dwv-inputs.js';
import { dwvCautions } from './second/dwv-cautions.js';
import type { DwvRequest } from './second/dwv.input.js';
import { secondDwvPlan } from './second/dwv.js';
import { gallonsPerFoot } from './second/physics.js';
import { agree } from './support/agreement.js';
import { useCalcServer } from './support/calc-server.js';
import { codeDifferences, differences, ruleDifferences } from './support/differences.js';

interface Reason {
  code: string;
  params: Record<string, unknown>;
}

describe('the DWV plan, computed twice', () => {
  const server = useCalcServer();

  it('is the same in every field', async () => {
    await agree(dwvInputs, async (given) => {
      const { reasons, takeDown, ...expected } = secondDwvPlan(given);
      const body = await server.answer('dwv-plan', given);
      return [
        ...differences(expected, body),
        ...reasonDifferences(reasons, body.reasons as Reason[]),
        ...codeDifferences(takeDown, body.takeDown, 'takeDown'),
        ...ruleDifferences(dwvCautions(given, secondDwvPlan(given)), body.cautions, 'cautions'),
      ];
    });
  });

  it('has more pressure under more head', async () => {
    await agree(
      dwvInputs.filter(({ method }) => method !== 'air'),
      async (given) => {
        const { levels } = (await server.answer('dwv-plan', given)) as {
          levels: { headFt: number; pressurePsi: number }[];
        };
        const byHead = [...levels].sort((a, b) => a.headFt - b.headFt);
        return byHead.flatMap(({ headFt, pressurePsi }, index) => {
          const below = byHead[index - 1];
          if (headFt === 0) return pressurePsi === 0 ? [] : ['pressure without head'];
          const isMore = !below || headFt - below.headFt < 1e-9 || pressurePsi > below.pressurePsi;
          return isMore ? [] : [`${headFt} ft: ${pressurePsi} psi, less than at ${below.headFt} ft`];
        });
      },
      60,
    );
  });

  it('never holds more than its pipes do', async () => {
    await agree(
      dwvInputs.filter(({ method }) => method !== 'air'),
      async (given) => {
        const whole = (given.pipes ?? []).reduce(
          (sum, pipe) => sum + pipe.lengthFt * gallonsPerFoot(pipe.nominalIn),
          0,
        );
        const volumeGal = Number((await server.answer('dwv-plan', given)).volumeGal);
        return volumeGal >= 0 && volumeGal <= whole * (1 + 1e-9) ? [] : [`${volumeGal} gal of ${whole}`];
      },
      60,
    );
  });

  it('comes back through its units: pounds and gallons give the density by which psi give back the feet', async () => {
    let closed = 0;
    await agree(
      dwvInputs.filter(({ method }) => method !== 'air'),
      async (given) => {
        const body = await server.answer('dwv-plan', given);
        const volumeGal = Number(body.volumeGal);
        if (volumeGal === 0) return [];
        closed += 1;
        // NIST SP 811: pound 0.45359237 kg, US gallon 3.785411784 L, psi 6894.757 Pa, foot 0.3048 m
        const density = (Number(body.weightLb) * 0.45359237) / (volumeGal * 0.003785411784);
        const back = (pressurePsi: number) => (pressurePsi * 6894.757293168361) / (density * 9.80665 * 0.3048);
        const levels = body.levels as { headFt: number; pressurePsi: number }[];
        const minutes = given.fillRateGpm == null ? null : Number(body.fillMinutes) * given.fillRateGpm;
        return [
          ...levels.flatMap(({ headFt, pressurePsi }) => differences(headFt, back(pressurePsi), 'feet')),
          ...(minutes === null ? [] : differences(volumeGal, minutes, 'gallons')),
        ];
      },
      60,
    );
    expect(closed).toBeGreaterThan(15);
  });

  it('does not mind from where heights are measured', async () => {
    await agree(
      dwvInputs.filter(({ method }) => method !== 'air'),
      async (given) => {
        const rise = 1.75;
        const up = (feet: number | null | undefined) => (feet == null ? feet : feet + rise);
        const wash = given.laundry;
        const moved: DwvRequest = {
          ...given,
          lowestFittingFt: given.lowestFittingFt + rise,
          highestFittingFt: given.highestFittingFt + rise,
          ventTerminalFt: given.ventTerminalFt + rise,
          atticCutFt: up(given.atticCutFt),
          standpipeFt: up(given.standpipeFt),
          laundry: wash && { ...wash, boxOutletFt: wash.boxOutletFt + rise, branchFt: wash.branchFt + rise },
          floors: given.floors?.map((floor) => ({ ...floor, elevationFt: floor.elevationFt + rise })),
          plugs: given.plugs?.map((plug) => ({ ...plug, elevationFt: plug.elevationFt + rise })),
          pipes: given.pipes?.map((pipe) => ({ ...pipe, bottomFt: pipe.bottomFt + rise, topFt: pipe.topFt + rise })),
        };
        const [here, there] = await Promise.all([given, moved].map((each) => server.answer('dwv-plan', each)));
        const told = (body: typeof here) => {
          const { shortByFt, usable, plugs, volumeGal, weightLb, fillMinutes, takeDown } = body ?? {};
          const heads = (body?.levels as { headFt: number }[]).map(({ headFt }) => headFt);
          return { shortByFt, usable, plugs, volumeGal, weightLb, fillMinutes, takeDown, heads };
        };
        const { plugs: before, ...rest } = told(here);
        const { plugs: after, ...moreRest } = told(there);
        const still = (list: unknown) => (list as { pressurePsi: number }[]).map(({ pressurePsi }) => pressurePsi);
        return [...differences(rest, moreRest), ...differences(still(before), still(after), 'plugs')];
      },
      60,
    );
  });
});

/** Codes as a set; what the text gives with a code (how much is lacking, which plug) must be among its parameters. */
function reasonDifferences(expected: { code: string; about: string | number | null }[], actual: Reason[]): string[] {
  const told = actual.map((reason) => ({ ...reason }));
  const missing = expected.filter(({ code, about }) => {
    const index = told.findIndex((each) => each.code === code && isAbout(each, about));
    if (index >= 0) told.splice(index, 1);
    return index < 0;
  });
  return [
    ...missing.map(({ code, about }) => `reasons: ${code} (${about}) missing in ${JSON.stringify(actual)}`),
    ...told.map(({ code }) => `reasons: ${code} is not due`),
  ];
}

function isAbout({ params }: Reason, about: string | number | null): boolean {
  if (about === null) return true;
  return Object.values(params).some((value) => differences(about, value).length === 0);
}
