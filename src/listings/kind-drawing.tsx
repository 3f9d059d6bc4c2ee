// The line drawing of a kind of unit, where there is no photo.
import type { UnitKind } from '../../shared/catalogue/kinds';
import { AutomaticSide } from '../ui/art/automatic-side';
import { AxleRear } from '../ui/art/axle-rear';
import type { DrawingProps } from '../ui/art/drawing';
import { ManualSide } from '../ui/art/manual-side';
import { TransferCaseSide } from '../ui/art/transfer-case-side';

const DRAWINGS = {
  automatic: AutomaticSide,
  manual: ManualSide,
  transfer_case: TransferCaseSide,
  axle: AxleRear,
} as const;

export function KindDrawing({ kind, ...rest }: { readonly kind: UnitKind } & DrawingProps) {
  const Drawn = DRAWINGS[kind];
  return <Drawn thin label={null} {...rest} />;
}
