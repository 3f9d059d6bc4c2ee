// One half of a pair: who and when above, the photo below, a ring on the spot that is talked about.
import type { PairView } from './use-pair-view';

export interface PairSide {
  /** Left out when this side took no such photo. */
  readonly src?: string;
  readonly alt: string;
  /** "Sat 7 Mar, 15:12, shot 8" */
  readonly note: string;
  /** The spot that is talked about, as shares of the photo from its top left. */
  readonly ring?: { readonly x: number; readonly y: number };
}

const RING = { className: 'pair-ring', r: 46, fill: 'none' } as const;

interface PairPhotoProps {
  readonly title: string;
  readonly side: PairSide;
  readonly view: PairView;
}

export function PairPhoto({ title, side, view }: PairPhotoProps) {
  return (
    <figure>
      <figcaption>
        <b>{title}</b>
        {side.note}
      </figcaption>
      <div className="pair-window" onPointerMove={view.onPointerMove}>
        {side.src ? (
          <div className="pair-moved" style={{ transform: view.transform }}>
            <img src={side.src} alt={side.alt} draggable={false} />
            {side.ring && (
              <svg viewBox="0 0 400 300" aria-hidden="true">
                <circle
                  {...RING}
                  cx={side.ring.x * 400}
                  cy={side.ring.y * 300}
                  stroke="#000"
                  strokeWidth="7"
                />
                <circle
                  {...RING}
                  cx={side.ring.x * 400}
                  cy={side.ring.y * 300}
                  stroke="var(--amber)"
                  strokeWidth="3.5"
                />
              </svg>
            )}
          </div>
        ) : (
          <p className="pair-missing">No photo of this shot</p>
        )}
      </div>
    </figure>
  );
}
