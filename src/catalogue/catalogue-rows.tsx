// The rows of the catalogue as plain lists: units, adapters, vehicles.
import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router-dom';
import type { Adapter } from '../../shared/catalogue/adapter';
import type { FamilySummary } from '../../shared/catalogue/contract';
import type { VehicleModel } from '../../shared/catalogue/vehicle';
import { paths } from '../paths';
import { DataTable, type Column } from '../ui/data-table';
import { FourStates } from '../ui/four-states';
import { Money } from '../ui/money';
import { Sheet } from '../ui/sheet';
import { Tabs } from '../ui/tabs';
import { adaptersQuery, familiesQuery, vehiclesQuery } from './api';
import { inches, unitWords } from './family-words';

const FAMILIES: readonly Column<FamilySummary>[] = [
  {
    head: 'Unit',
    phone: 'name',
    cell: (row) => (
      <Link className="link catalogue-name" to={paths.family.to({ id: row.id })}>
        {row.name}
      </Link>
    ),
  },
  { head: 'Id', cell: (row) => <span className="code xs">{row.id}</span> },
  { head: 'What it is', cell: unitWords },
  { head: 'Variants', number: true, phone: 'labelled', cell: (row) => String(row.variantCount) },
];

const ADAPTERS: readonly Column<Adapter>[] = [
  { head: 'Part', phone: 'name', cell: (row) => row.label },
  { head: 'Joint', phone: 'labelled', cell: (row) => row.interface },
  { head: 'Adds', number: true, phone: 'labelled', cell: (row) => inches(row.addsMm) },
  { head: 'Costs', number: true, phone: 'amount', cell: (row) => <Money cents={row.costCents} /> },
  { head: 'Source', phone: 'hidden', cell: (row) => row.source },
];

const VEHICLES: readonly Column<VehicleModel>[] = [
  { head: 'Vehicle', phone: 'name', cell: (row) => `${row.make} ${row.model}` },
  { head: 'Model years', number: true, phone: 'labelled', cell: (row) => `${row.yearFrom} to ${row.yearTo}` },
  { head: 'Engine', cell: (row) => row.engine },
  { head: 'Drive', phone: 'amount', cell: (row) => row.drive },
  { head: 'Axle', number: true, phone: 'labelled', cell: (row) => row.axleRatio.toFixed(2) },
  { head: 'Source', phone: 'hidden', cell: (row) => row.source },
];

type Row = { readonly id: string };
const keyOf = (row: Row): string => row.id;

function Families() {
  return (
    <FourStates query={useQuery(familiesQuery())} waiting="Reading the units">
      {(rows) => <DataTable caption="Units" columns={FAMILIES} rows={rows} rowKey={keyOf} />}
    </FourStates>
  );
}

function Adapters() {
  return (
    <FourStates query={useQuery(adaptersQuery())} waiting="Reading the adapters">
      {(rows) => <DataTable caption="Adapters" columns={ADAPTERS} rows={rows} rowKey={keyOf} />}
    </FourStates>
  );
}

function Vehicles() {
  return (
    <FourStates query={useQuery(vehiclesQuery())} waiting="Reading the vehicles">
      {(rows) => <DataTable caption="Vehicles" columns={VEHICLES} rows={rows} rowKey={keyOf} />}
    </FourStates>
  );
}

const VIEWS = ['families', 'adapters', 'vehicles'] as const;
type View = (typeof VIEWS)[number];

interface CatalogueRowsProps {
  readonly shown: View;
  readonly onShow: (view: View) => void;
}

export function CatalogueRows({ shown, onShow }: CatalogueRowsProps) {
  return (
    <Sheet>
      <Tabs
        label="What to list"
        value={shown}
        onChange={(value) => onShow(VIEWS.find((view) => view === value) ?? 'families')}
        tabs={[
          { value: 'families', label: 'Units', content: <Families /> },
          { value: 'adapters', label: 'Adapters', content: <Adapters /> },
          { value: 'vehicles', label: 'Vehicles', content: <Vehicles /> },
        ]}
      />
    </Sheet>
  );
}
