// Two photos of the same shot side by side: as sent and as received. Zoom and pan move both; a strip leads to every pair.
import clsx from 'clsx';
import { ArrowLeft, ArrowRight, ZoomIn, ZoomOut } from 'lucide-react';
import { Button } from './button';
import { PairPhoto, type PairSide } from './pair-photo';
import { usePairView } from './use-pair-view';

export type { PairSide } from './pair-photo';

export interface PhotoPair {
  readonly key: string;
  /** The shot's number on the shot list. */
  readonly number: number;
  /** "Bell face" */
  readonly label: string;
  readonly left: PairSide;
  readonly right: PairSide;
  /** Somebody marked that the two do not show the same. */
  readonly differs?: boolean;
}

interface PairViewerProps {
  readonly pairs: readonly PhotoPair[];
  readonly index: number;
  readonly onIndex: (index: number) => void;
  /** "As sent by Abara Driveline" */
  readonly leftTitle: string;
  /** "As received by Quenby" */
  readonly rightTitle: string;
}

function Strip({ pairs, index, onIndex }: Pick<PairViewerProps, 'pairs' | 'index' | 'onIndex'>) {
  return (
    <ul className="pair-strip">
      {pairs.map((pair, at) => (
        <li key={pair.key}>
          <button
            type="button"
            className={clsx(at === index && 'pair-on')}
            aria-current={at === index ? 'true' : undefined}
            aria-label={`Shot ${pair.number}, ${pair.label}${pair.differs ? ', differs' : ''}`}
            onClick={() => onIndex(at)}
          >
            <span className="pair-thumbs" aria-hidden="true">
              {[pair.left, pair.right].map((side, half) =>
                side.src ? (
                  <img key={half} src={side.src} alt="" loading="lazy" />
                ) : (
                  <span key={half} className="pair-none" />
                ),
              )}
            </span>
            <span className={clsx('pair-name', pair.differs && 'pair-differs')} aria-hidden="true">
              <b className="num">{pair.number}</b>
              {pair.label}
              {pair.differs && ', differs'}
            </span>
          </button>
        </li>
      ))}
    </ul>
  );
}

export function PairViewer({ pairs, index, onIndex, leftTitle, rightTitle }: PairViewerProps) {
  const view = usePairView();
  const pair = pairs[index];
  if (!pair) return null;
  const previous = pairs[index - 1];
  const next = pairs[index + 1];
  const go = (to: number) => {
    view.reset();
    onIndex(to);
  };
  return (
    <div className="pair-viewer">
      {/* eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex, jsx-a11y/no-noninteractive-element-interactions -- larger photos are moved with the arrow keys */}
      <div
        className="pair"
        role="group"
        aria-label={`Shot ${pair.number}, ${pair.label}. Arrow keys move both photos.`}
        tabIndex={0}
        onKeyDown={view.onKeyDown}
      >
        <PairPhoto title={leftTitle} side={pair.left} view={view} />
        <PairPhoto title={rightTitle} side={pair.right} view={view} />
      </div>
      <div className="pair-tools">
        <Button
          icon={ArrowLeft}
          disabled={!previous}
          onClick={() => go(index - 1)}
          aria-label={previous ? `Back to ${previous.label}` : 'Back'}
        >
          <span>{previous?.label ?? 'First'}</span>
        </Button>
        <b aria-live="polite">
          Shot {pair.number} of {pairs.length}, {pair.label.toLowerCase()}
        </b>
        <div className="flex">
          <Button
            icon={view.zoom > 1 ? ZoomOut : ZoomIn}
            onClick={view.nextZoom}
            aria-label={view.zoom >= 3 ? 'Whole photos' : 'Zoom both'}
          >
            <span>{view.zoom >= 3 ? 'Whole photos' : 'Zoom both'}</span>
          </Button>
          <Button
            iconAfter={ArrowRight}
            disabled={!next}
            onClick={() => go(index + 1)}
            aria-label={next ? `On to ${next.label}` : 'On'}
          >
            <span>{next?.label ?? 'Last'}</span>
          </Button>
        </div>
      </div>
      <Strip pairs={pairs} index={index} onIndex={go} />
    </div>
  );
}
