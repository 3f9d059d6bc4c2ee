// The product's sign: three sprags between two races, the middle one live.
import { SPRAG_PATH, TIPPED_DEGREES } from './sprag';

const tipped = (x: number, y: number) => `translate(${x} ${y}) rotate(${TIPPED_DEGREES}) scale(.6)`;

export function Mark({ size = 36 }: { readonly size?: number }) {
  return (
    <svg width={size} height={size} viewBox="0 0 40 40" aria-hidden="true">
      <path d="M1 8.5Q20 1.5 39 8.5" fill="none" stroke="currentColor" strokeWidth="5" />
      <path d="M3 34.5Q20 30 37 34.5" fill="none" stroke="currentColor" strokeWidth="2.6" />
      <g fill="currentColor">
        <path transform={tipped(8, 20.6)} d={SPRAG_PATH} />
        <path transform={tipped(32, 20.6)} d={SPRAG_PATH} />
      </g>
      <path transform={tipped(20, 19.2)} d={SPRAG_PATH} fill="var(--red)" />
    </svg>
  );
}
