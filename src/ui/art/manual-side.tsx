// A manual transmission from the left: input shaft, bellhousing, case with shift tower, tail housing.
import { Drawing, type DrawingProps } from './drawing';

export function ManualSide(props: DrawingProps) {
  return (
    <Drawing viewBox="0 0 640 280" label="Side view of a manual transmission" {...props}>
      <path className="a" d="M0 140H640" />
      <path className="o" d="M2 134h34v12H2z" />
      <path className="d" d="M2 137h20M2 143h20" />
      <path className="o" d="M36 34l4-10h12l2 10v200l-2 12H40l-4-12z" />
      <path className="o" d="M54 38C100 44 132 60 150 78V202C132 220 100 232 54 238Z" />
      <path className="o" d="M84 186h30v24H84z" />
      <path className="o" d="M150 70h12v140h-12z" />
      <path className="o" d="M162 76H366L378 88V196L366 208H162Z" />
      <path className="d" d="M162 96H378M162 188H378M200 96v92M240 96v92M280 96v92M320 96v92" />
      <circle className="o" cx="182" cy="196" r="8" />
      <circle className="o" cx="300" cy="142" r="9" />
      <path className="o" d="M196 76V62H326V76" />
      <path className="d" d="M206 62v14M246 62v14M286 62v14M316 62v14" />
      <path className="o" d="M286 62l4-22h28l4 22z" />
      <path className="o" d="M299 40L296 4h12l-3 36z" />
      <path className="o" d="M378 80h12v122h-12z" />
      <path className="o" d="M390 90C440 100 486 112 520 116V166C486 170 440 184 390 192Z" />
      <path className="d" d="M390 120C440 124 486 129 520 130M390 162C440 158 486 154 520 152" />
      <path className="o" d="M440 178h44v20h-44z" />
      <path className="o" d="M520 110h12v62h-12zM532 126h46v28h-46z" />
      <path className="o" d="M578 114h9v52h-9z" />
    </Drawing>
  );
}
