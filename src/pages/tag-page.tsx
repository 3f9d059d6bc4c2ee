// Behind the QR of a tag: leads whoever scans it to what it is to them.
import { useQuery } from '@tanstack/react-query';
import { Navigate, useParams } from 'react-router-dom';
import { formatTag, isTagCode, normaliseTag } from '../../shared/kernel/tag-code';
import { tagQuery } from '../orders/api';
import { paths } from '../paths';
import { Page } from '../shell/layout';
import { AxleRear } from '../ui/art/axle-rear';
import { ButtonLink } from '../ui/button';
import { EmptyState } from '../ui/empty-state';
import { FourStates } from '../ui/four-states';
import { PageTitle } from '../ui/page-title';
import { isMissing } from './is-missing';

/** A core found by somebody who is no party to its order, or a tag that hangs on nothing. */
function Stranger({ code, core }: { readonly code: string; readonly core: boolean }) {
  return (
    <EmptyState
      title={core ? 'A core on its way back' : 'This tag is not on any rack'}
      drawing={<AxleRear thin label={null} />}
      actions={
        <>
          <ButtonLink look="go" size="big" to={paths.signIn.to({ next: paths.tag.to({ tag: code }) })}>
            Sign in
          </ButtonLink>
          <ButtonLink size="big" to={paths.results.to()}>
            Find a core
          </ButtonLink>
        </>
      }
    >
      <p>
        {core
          ? 'Its order is open to the builder and the yard only. Sign in if you are one of them.'
          : 'Check each character of the code. Tag codes look like AB12-CD34-E.'}{' '}
        Tag <b className="code">{formatTag(code)}</b>.
      </p>
    </EmptyState>
  );
}

export function TagPage() {
  const { tag = '' } = useParams();
  const code = normaliseTag(tag);
  const query = useQuery({ ...tagQuery(code), enabled: isTagCode(code) });
  const found = query.data;
  if (found?.orderId) {
    const desk = found.kind === 'core' && found.role === 'seller';
    const to = desk ? paths.receive.to({ orderId: found.orderId }) : paths.order.to({ id: found.orderId });
    return <Navigate to={to} replace />;
  }
  if (found?.listingId) return <Navigate to={paths.listing.to({ id: found.listingId })} replace />;
  return (
    <Page>
      <PageTitle title={`Tag ${formatTag(code)}`} className="vh" />
      <div className="mt-44">
        {!isTagCode(code) || isMissing(query.error) ? (
          <Stranger code={code} core={false} />
        ) : (
          <FourStates query={query} waiting="Looking for the tag">
            {(data) => <Stranger code={code} core={data.kind === 'core'} />}
          </FourStates>
        )}
      </div>
    </Page>
  );
}
