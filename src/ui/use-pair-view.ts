// One zoom and one place for both photos of a pair.
import { useState, type KeyboardEvent, type PointerEvent } from 'react';

export interface PairView {
  /** 1, 2 or 3. */
  readonly zoom: number;
  readonly transform: string;
  readonly nextZoom: () => void;
  readonly reset: () => void;
  readonly onKeyDown: (event: KeyboardEvent) => void;
  readonly onPointerMove: (event: PointerEvent) => void;
}

interface Place {
  readonly zoom: number;
  /** Percent of the window, at most half of what the zoom hides. */
  readonly x: number;
  readonly y: number;
}

const WHOLE: Place = { zoom: 1, x: 0, y: 0 };
const MOST = 3;
const KEY_STEP = 10;

const MOVES: Readonly<Record<string, readonly [x: number, y: number]>> = {
  ArrowLeft: [KEY_STEP, 0],
  ArrowRight: [-KEY_STEP, 0],
  ArrowUp: [0, KEY_STEP],
  ArrowDown: [0, -KEY_STEP],
};

function moved(place: Place, x: number, y: number): Place {
  const limit = ((place.zoom - 1) * 100) / 2;
  const clamp = (value: number) => Math.min(limit, Math.max(-limit, value));
  return { zoom: place.zoom, x: clamp(place.x + x), y: clamp(place.y + y) };
}

export function usePairView(): PairView {
  const [place, setPlace] = useState(WHOLE);
  const zoomTo = (zoom: number) => setPlace((old) => (zoom === 1 ? WHOLE : moved({ ...old, zoom }, 0, 0)));
  return {
    zoom: place.zoom,
    transform: `translate(${place.x}%, ${place.y}%) scale(${place.zoom})`,
    nextZoom: () => zoomTo(place.zoom >= MOST ? 1 : place.zoom + 1),
    reset: () => setPlace(WHOLE),
    onKeyDown: (event) => {
      if (event.key === '+' || event.key === '=') zoomTo(Math.min(MOST, place.zoom + 1));
      if (event.key === '-') zoomTo(Math.max(1, place.zoom - 1));
      const move = MOVES[event.key];
      if (!move || place.zoom === 1) return;
      event.preventDefault();
      setPlace((old) => moved(old, move[0], move[1]));
    },
    onPointerMove: (event) => {
      if (event.buttons === 0 || place.zoom === 1) return;
      const box = event.currentTarget.getBoundingClientRect();
      setPlace((old) =>
        moved(old, (event.movementX / box.width) * 100, (event.movementY / box.height) * 100),
      );
    },
  };
}
