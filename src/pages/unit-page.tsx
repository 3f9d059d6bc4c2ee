// The page of one unit: everything proved about it on the left, the buy panel on the right.
import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';
import { useParams } from 'react-router-dom';
import type { ListingPage } from '../../shared/listings/page';
import { CodeApart } from '../listings/unit/code-apart';
import { ConditionSheet } from '../listings/unit/condition-sheet';
import { Promises } from '../listings/unit/promises';
import { ReturnTerms } from '../listings/unit/return-terms';
import { SellerRecord } from '../listings/unit/seller-record';
import { SimilarUnits } from '../listings/unit/similar-units';
import { UnitCautions } from '../listings/unit/unit-cautions';
import { UnitFacts } from '../listings/unit/unit-facts';
import { unitPageQuery } from '../listings/unit/unit-api';
import { UnitMissing, UnitStopped } from '../listings/unit/unit-gone';
import { UnitPhotos } from '../listings/unit/unit-photos';
import { UnitTag } from '../listings/unit/unit-tag';
import { ReserveForm, type ReserveListing } from '../orders/reserve-form';
import { Page } from '../shell/layout';
import { BottomBar } from '../ui/bottom-bar';
import { buttonClass } from '../ui/button';
import { FourStates } from '../ui/four-states';
import { Money } from '../ui/money';
import { PageTitle } from '../ui/page-title';
import { Panel } from '../ui/sheet';
import { isMissing } from './is-missing';

const BUY_ID = 'buy';

function reserveListing(unit: ListingPage): ReserveListing {
  const { terms, freight, seller } = unit;
  return {
    listingId: unit.id,
    exchange: terms.exchange && {
      priceCents: terms.priceCents,
      depositCents: terms.exchange.depositCents,
      windowDays: terms.exchange.windowDays,
      returnFreight: terms.exchange.returnFreight,
    },
    outrightCents: terms.outrightCents,
    freight: freight.quote,
    sellerName: seller.name,
    sellerPlace: `${seller.city}, ${seller.region}`,
    zone: seller.timeZone,
  };
}

interface BuyProps {
  readonly unit: ListingPage;
  readonly onZip: (zip: string) => void;
}

function Buy({ unit, onZip }: BuyProps) {
  return (
    <Panel label="Buy" className="buy">
      <div id={BUY_ID} tabIndex={-1} className="panel-body">
        <p className="b">{unit.usedNotice}</p>
        {unit.status === 'live' ? (
          <ReserveForm listing={reserveListing(unit)} onZip={onZip} />
        ) : (
          <UnitStopped status={unit.status} familyId={unit.family.id} />
        )}
      </div>
      <Promises unit={unit} />
    </Panel>
  );
}

/** The sum that can be said before a ZIP code is known, and the way to the panel. */
function BuyBar({ unit }: { readonly unit: ListingPage }) {
  if (unit.status !== 'live') return null;
  return (
    <BottomBar label="Buy">
      <span className="buy-bar-sum">
        <span className="sm mute">{unit.usedNotice}. Pay today, before freight</span>
        <Money cents={unit.terms.totalCents} size={22} />
      </span>
      <a className={buttonClass({ look: 'go', size: 'big' })} href={`#${BUY_ID}`}>
        {unit.terms.exchange ? 'Buy for exchange' : 'Buy outright'}
      </a>
    </BottomBar>
  );
}

function UnitBody({ unit, onZip }: BuyProps) {
  return (
    <>
      <UnitTag unit={unit} />
      <div className="unit-layout">
        <div className="min-w-0">
          <UnitPhotos unit={unit} />
          <CodeApart unit={unit} />
          <ConditionSheet unit={unit} />
          <ReturnTerms unit={unit} />
          <UnitFacts unit={unit} />
          <UnitCautions unit={unit} />
          <SellerRecord unit={unit} />
          <SimilarUnits unit={unit} />
        </div>
        <Buy unit={unit} onZip={onZip} />
      </div>
      <BuyBar unit={unit} />
    </>
  );
}

export function UnitPage() {
  const { id = '' } = useParams();
  const [zip, setZip] = useState<string | null>(null);
  const query = useQuery(unitPageQuery(id, zip));
  return (
    <Page wired>
      {!query.data && <PageTitle title="Unit" className="vh" />}
      {isMissing(query.error) && !query.data ? (
        <div className="mt-44">
          <UnitMissing />
        </div>
      ) : (
        <FourStates query={query} waiting="Reading the tag">
          {(unit) => <UnitBody key={unit.id} unit={unit} onZip={setZip} />}
        </FourStates>
      )}
    </Page>
  );
}
