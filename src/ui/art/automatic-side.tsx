// An automatic transmission from the left: converter shaft, bellhousing, case with pan, tail housing and yoke.
import { Drawing, type DrawingProps } from './drawing';

/** The unit without its centre line, for use inside another drawing. */
export function AutomaticParts() {
  return (
    <>
      <path className="o" d="M14 104h22v36H14zM0 112h14v20H0z" />
      <path className="o" d="M36 22l4-10h12l2 10v200l-2 12H40l-4-12z" />
      <path className="d" d="M36 44h18M36 84h18M36 160h18M36 200h18" />
      <path className="o" d="M54 26C92 30 128 44 160 62V190C128 206 92 216 54 220Z" />
      <path
        className="d"
        d="M54 60C96 62 130 70 160 80M54 96C96 97 130 99 160 102M54 150C96 149 130 146 160 142M54 186C96 184 130 178 160 168"
      />
      <path className="o" d="M160 58h14v138h-14z" />
      <path className="o" d="M174 64H404L416 76V184H174Z" />
      <path className="d" d="M174 84H410M174 172H416M214 64v20M262 64v20M310 64v20M358 64v20" />
      <path className="o" d="M196 98h92v34h-92z" />
      <path className="d" d="M203 105h78v20h-78z" />
      <path className="d" d="M212 110v10M222 110v10M232 110v10M242 110v10M252 110v10M262 110v10M272 110v10" />
      <circle className="o" cx="352" cy="128" r="26" />
      <circle className="d" cx="352" cy="128" r="18" />
      <path className="d" d="M340 128h24M352 116v24" />
      <circle className="o" cx="222" cy="154" r="11" />
      <circle className="d" cx="222" cy="154" r="6" />
      <path className="o" d="M262 148h28v12h-28z" />
      <path className="o" d="M272 154l-20 48h11l20-48z" />
      <path className="o" d="M388 92h12v10h-12zM388 106h12v10h-12z" />
      <path className="o" d="M168 184H420V196H168Z" />
      <path
        className="d"
        d="M186 184v12M218 184v12M250 184v12M282 184v12M314 184v12M346 184v12M378 184v12M404 184v12"
      />
      <path className="o" d="M180 196H410L392 240H204Z" />
      <path className="d" d="M196 212H402" />
      <path className="o" d="M286 240h22v7h-22z" />
      <path className="o" d="M416 62h12v130h-12z" />
      <path className="o" d="M428 70C464 78 496 88 520 94V150C496 158 464 170 428 182Z" />
      <path className="d" d="M428 96C462 100 494 106 520 109M428 150C462 146 494 140 520 136" />
      <path className="o" d="M452 170h46v22h-46z" />
      <path className="d" d="M462 170v22M488 170v22" />
      <path className="o" d="M520 88h10v70h-10zM530 106h34v34h-34z" />
      <path className="o" d="M564 92h10v62h-10z" />
      <path className="o" d="M574 96l34-4c10 2 10 18 0 22l-24 6zM574 150l34 4c10-2 10-18 0-22l-24-6z" />
      <circle className="d" cx="606" cy="103" r="6" />
      <circle className="d" cx="606" cy="143" r="6" />
    </>
  );
}

export function AutomaticSide(props: DrawingProps) {
  return (
    <Drawing viewBox="0 0 640 280" label="Side view of an automatic transmission" {...props}>
      <path className="a" d="M0 122H640" />
      <AutomaticParts />
    </Drawing>
  );
}
