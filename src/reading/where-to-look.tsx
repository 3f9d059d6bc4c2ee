// Where the code stands on each kind of unit, for somebody who has none yet.
import { Sheet } from '../ui/sheet';

/** Common practice in the trade. */
const PLACES: readonly { readonly kind: string; readonly place: string }[] = [
  {
    kind: 'Automatic',
    place: 'Machined rail above the pan, left side; or the edge of the bellhousing flange.',
  },
  { kind: 'Manual', place: 'Flat pad on the side of the case, below the shift cover.' },
  {
    kind: 'Transfer case',
    place: 'Tag on the rear half, under a case bolt; some have it stamped beside the filler plug.',
  },
  {
    kind: 'Axle',
    place: 'Tag under a cover bolt; or stamped on the right tube, next to the centre section.',
  },
];

export function WhereToLook() {
  return (
    <Sheet pad>
      <div className="grid gap-14">
        <h2>Where to look</h2>
        <dl className="where">
          {PLACES.map(({ kind, place }) => (
            <div key={kind}>
              <dt>{kind}</dt>
              <dd>{place}</dd>
            </div>
          ))}
        </dl>
        <p className="sm">
          Wipe the pad with a rag and rub chalk over it, or hold a lamp flat to the metal. The long number
          cast in relief is the raw casting: many variants share it, so it narrows but does not settle.
        </p>
        <p className="sm">
          A unit whose number has been ground off is not to be bought or sold: removing it is a crime (18
          U.S.C. 511).
        </p>
      </div>
    </Sheet>
  );
}
