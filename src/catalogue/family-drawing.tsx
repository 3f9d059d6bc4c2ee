// The line drawing of each kind of unit.
import type { UnitKind } from '../../shared/catalogue/kinds';
import { AutomaticSide } from '../ui/art/automatic-side';
import { AxleRear } from '../ui/art/axle-rear';
import { ManualSide } from '../ui/art/manual-side';
import { TransferCaseSide } from '../ui/art/transfer-case-side';

export function FamilyDrawing({ kind }: { readonly kind: UnitKind }) {
  switch (kind) {
    case 'automatic':
      return <AutomaticSide thin label={null} />;
    case 'manual':
      return <ManualSide thin label={null} />;
    case 'transfer_case':
      return <TransferCaseSide thin label={null} />;
    case 'axle':
      return <AxleRear thin label={null} />;
  }
}
