import type { Tract } from '@holdwater/shared-types/lots/tract.contract.js';
import type { ReactNode } from 'react';
import { useTranslation } from 'react-i18next';
import { useNavigate } from 'react-router-dom';
import { Mark } from '../../../components/mark';
import { parcelGrounds } from '../../../drawings/plat-lot';
import { Plat } from '../../../drawings/plat';
import { usePatterns } from '../../../drawings/patterns';
import { inOrder, stateCounts, type LotRow } from '../lots-model';

export interface PlatPartProps {
  tract: Tract | null;
  rows: readonly LotRow[];
  stageName: string;
  chosenId: string | null;
  onChoose: (lotId: string) => void;
}

/** The tract drawn, each parcel in its plumbing state; without a drawing its lots in order as a ruled strip. */
export function PlatPart({ tract, rows, stageName, chosenId, onChoose }: PlatPartProps): ReactNode {
  const navigate = useNavigate();
  const drawing = tract?.plat ?? null;
  if (drawing === null || tract === null) {
    return (
      <>
        <Legend rows={rows} stageName={stageName} />
        <LotStrip rows={rows} chosenId={chosenId} onChoose={onChoose} />
      </>
    );
  }
  const byNumber = new Map(rows.map((row) => [row.lot.number, row]));
  const placed = drawing.parcels.map((parcel) => ({ parcel, row: byNumber.get(parcel.lotNumber) }));
  const drawn = new Set(placed.flatMap(({ row }) => (row ? [row.lot.id] : [])));
  const undrawn = rows.filter(({ lot }) => !drawn.has(lot.id));
  return (
    <>
      <Legend rows={rows} stageName={stageName} />
      <div className="plat-place">
        <Plat
          tract={tract.name}
          lots={placed.flatMap(({ parcel, row }) =>
            row ? [{ id: row.lot.id, number: row.lot.number, polygon: parcel.points, state: row.state }] : [],
          )}
          otherParcels={placed.flatMap(({ parcel, row }) =>
            row ? [] : [{ name: parcel.lotNumber, polygon: parcel.points }],
          )}
          roads={drawing.roads.map((road) => ({ name: road.name, centerline: road.points }))}
          northDegrees={drawing.northDegrees}
          chosen={chosenId}
          onChoose={onChoose}
          onOpen={(lotId) => void navigate(`/lots/${lotId}`)}
        />
      </div>
      {undrawn.length > 0 ? <LotStrip rows={undrawn} chosenId={chosenId} onChoose={onChoose} /> : null}
    </>
  );
}

/** Lots in the order of their numbers, each with its state. */
function LotStrip({ rows, chosenId, onChoose }: Pick<PlatPartProps, 'rows' | 'chosenId' | 'onChoose'>): ReactNode {
  const { t } = useTranslation(['lots', 'marks']);
  return (
    <div className="lot-strip" role="group" aria-label={t('plat.strip')}>
      {inOrder(rows).map(({ lot, state }) => (
        <button
          key={lot.id}
          type="button"
          className={lot.id === chosenId ? 'chosen' : undefined}
          aria-pressed={lot.id === chosenId}
          onClick={() => onChoose(lot.id)}
        >
          <span className="n b">{lot.number}</span>
          <Mark name={state} size={24} title={t(`marks.${state}`)} />
        </button>
      ))}
    </div>
  );
}

/** What each ground of the plat means, and how many lots lie so. */
function Legend({ rows, stageName }: Pick<PlatPartProps, 'rows' | 'stageName'>): ReactNode {
  const { t } = useTranslation(['lots', 'marks']);
  const patterns = usePatterns(['waves', 'batt']);
  return (
    <div className="plat-legend">
      <h2 className="h3">{t('plat.legend', { stage: stageName, count: rows.length })}</h2>
      <ul>
        {stateCounts(rows).map(({ state, count }) => {
          const { ground, pattern, edge } = parcelGrounds[state];
          return (
            <li key={state} className="row">
              <svg width="30" height="24" viewBox="0 0 30 24" aria-hidden="true">
                {pattern ? patterns.defs : null}
                <rect width="30" height="24" fill={ground} />
                {pattern ? <rect width="30" height="24" fill={patterns.fill(pattern)} opacity=".6" /> : null}
                <rect
                  x=".6"
                  y=".6"
                  width="28.8"
                  height="22.8"
                  fill="none"
                  stroke={edge ?? 'var(--ink)'}
                  strokeWidth={edge ? 2 : 1}
                />
              </svg>
              <Mark name={state} />
              <span className="s">
                {t(`marks.${state}`)} <span className="n b">{count}</span>
              </span>
            </li>
          );
        })}
      </ul>
    </div>
  );
}
