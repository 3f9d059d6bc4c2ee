// A transfer case from the left: input, chain case, rear and front outputs.
import { Drawing, type DrawingProps } from './drawing';

export function TransferCaseSide(props: DrawingProps) {
  return (
    <Drawing viewBox="0 0 640 280" label="Side view of a transfer case" {...props}>
      <path className="a" d="M110 90H540M60 206H420" />
      <path className="o" d="M150 74h34v32h-34z" />
      <path className="d" d="M150 82h24M150 90h24M150 98h24" />
      <path className="o" d="M184 34h16v112h-16z" />
      <path
        className="o"
        d="M200 40H262V30H284V246C284 258 250 262 236 254 214 242 214 220 214 196 214 168 200 150 200 140Z"
      />
      <path className="d" d="M200 70H284M200 110H284M214 180H284M222 232H284M232 40V70M232 110V180" />
      <path className="o" d="M284 26h14v234h-14z" />
      <path className="d" d="M284 58h14M284 98h14M284 138h14M284 178h14M284 218h14" />
      <path
        className="o"
        d="M298 34H372C392 40 396 60 392 92 388 130 372 168 360 214 354 244 330 254 298 252Z"
      />
      <path className="d" d="M298 66H388M298 120H384M298 170H372M298 222H356M330 34V252" />
      <circle className="o" cx="346" cy="150" r="9" />
      <circle className="o" cx="330" cy="232" r="8" />
      <path className="o" d="M392 54C420 60 450 64 474 66V114C450 116 420 122 392 128Z" />
      <path className="d" d="M392 78H474M392 104H474" />
      <path className="o" d="M474 58h10v64h-10zM484 76h30v28h-30z" />
      <path className="o" d="M514 62h9v56h-9z" />
      <path className="o" d="M523 66l26-3c8 2 8 15 0 18l-18 5zM523 114l26 3c8-2 8-15 0-18l-18-5z" />
      <path className="o" d="M150 190h64v32h-64z" />
      <path className="o" d="M138 176h12v60h-12z" />
      <path className="o" d="M138 180l-26-3c-8 2-8 15 0 18l18 5zM138 232l-26 3c-8-2-8-15 0-18l18-5z" />
      <path className="o" d="M236 10h64v20h-64z" />
      <path className="d" d="M250 10v20M284 10v20" />
      <path className="o" d="M404 20h52v28h-52z" />
      <path className="d" d="M414 20v28" />
    </Drawing>
  );
}
