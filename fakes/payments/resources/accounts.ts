// Connected accounts and the links by which a person fills them in on the hosted page.
import { z } from 'zod';
import { badParam, missing, ProviderError } from '../errors';
import { expandParam, metadata, readParams, webUrl } from '../form-decode';
import { listParams, pageOf } from '../lists';
import type { Account, AccountLink } from '../model/balance';
import { idOf, type Call, type Routes } from '../router';
import { accountBalance, newId, type Cause, type World } from '../world';

const LINK_SECONDS = 5 * 60;
const DUE = ['external_account', 'individual.id_number', 'tos_acceptance.date'];

const requested = z.strictObject({ requested: z.enum(['true', 'false']) });

const createParams = z.strictObject({
  type: z.literal('express', 'only express accounts are known here'),
  country: z.string().length(2).default('US'),
  email: z.email().optional(),
  business_type: z.enum(['individual', 'company', 'non_profit']).optional(),
  capabilities: z.record(z.string(), requested).optional(),
  default_currency: z.string().optional(),
  metadata: metadata.default({}),
  expand: expandParam,
});

const updateParams = z.strictObject({
  email: z.email().optional(),
  business_type: z.enum(['individual', 'company', 'non_profit']).optional(),
  metadata: metadata.default({}),
  expand: expandParam,
});

const linkParams = z.strictObject({
  account: z.string(),
  type: z.enum(['account_onboarding', 'account_update']),
  return_url: webUrl,
  refresh_url: webUrl,
  collection_options: z.unknown().optional(),
  expand: expandParam,
});

const stateOf = (
  open: boolean,
): Pick<Account, 'charges_enabled' | 'payouts_enabled' | 'details_submitted'> => ({
  charges_enabled: open,
  payouts_enabled: open,
  details_submitted: open,
});

const requirementsOf = (due: readonly string[]): Account['requirements'] => ({
  currently_due: [...due],
  disabled_reason: due.length > 0 ? 'requirements.past_due' : null,
  eventually_due: [...due],
  past_due: [...due],
  pending_verification: [],
});

function create({ world, form }: Call): Account {
  const params = readParams(createParams, form);
  const wanted = Object.keys(params.capabilities ?? { card_payments: true, transfers: true });
  const id = newId('acct', 16);
  const account = world.state.accounts.put(id, {
    id,
    object: 'account',
    business_type: params.business_type ?? null,
    capabilities: Object.fromEntries(wanted.map((name) => [name, 'inactive' as const])),
    country: params.country,
    created: world.seconds(),
    default_currency: params.default_currency ?? 'usd',
    email: params.email ?? null,
    metadata: params.metadata,
    requirements: requirementsOf(DUE),
    type: 'express',
    ...stateOf(false),
  });
  return account;
}

/** The person has given everything: the account may be paid and may pay out. */
export function completeOnboarding(world: World, account: Account, cause: Cause): Account {
  const open = world.state.accounts.put(account.id, {
    ...account,
    capabilities: Object.fromEntries(
      Object.keys(account.capabilities).map((name) => [name, 'active' as const]),
    ),
    requirements: requirementsOf([]),
    ...stateOf(true),
  });
  world.emit('account.updated', open, cause, open.id);
  return open;
}

/** The provider wants more from the person, and pays nothing out until it has it. */
export function restrictAccount(world: World, account: Account, cause: Cause): Account {
  const shut = world.state.accounts.put(account.id, {
    ...account,
    capabilities: Object.fromEntries(
      Object.keys(account.capabilities).map((name) => [name, 'inactive' as const]),
    ),
    requirements: requirementsOf(['individual.verification.document']),
    ...stateOf(false),
    details_submitted: true,
  });
  world.emit('account.updated', shut, cause, shut.id);
  return shut;
}

export function findAccount(world: World, id: string, param = 'id'): Account {
  const account = world.state.accounts.get(id);
  if (account !== undefined) return account;
  if (param !== 'id') throw missing('account', id, param);
  throw new ProviderError(403, {
    type: 'invalid_request_error',
    code: 'account_invalid',
    message: `The provided key does not have access to account '${id}' (or that account does not exist).`,
  });
}

function close(call: Call): object {
  const account = findAccount(call.world, idOf(call));
  if (accountBalance(call.world, account.id, account.default_currency) !== 0)
    throw badParam('An account with a balance cannot be deleted.', 'account_balance_not_zero');
  call.world.state.accounts.remove(account.id);
  return { id: account.id, object: 'account', deleted: true };
}

function createLink({ world, form }: Call): object {
  const params = readParams(linkParams, form);
  findAccount(world, params.account, 'account');
  const link: AccountLink = {
    id: newId('lnk', 32),
    account: params.account,
    refreshUrl: params.refresh_url,
    returnUrl: params.return_url,
    expiresAt: world.seconds() + LINK_SECONDS,
  };
  world.state.accountLinks.put(link.id, link);
  return {
    object: 'account_link',
    created: world.seconds(),
    expires_at: link.expiresAt,
    url: `${world.baseUrl()}/onboard/${link.id}`,
  };
}

export const accountRoutes: Routes = {
  'POST /v1/accounts': create,
  'GET /v1/accounts': ({ world, form, path }) =>
    pageOf(world.state.accounts.all(), readParams(z.strictObject(listParams), form), path),
  'GET /v1/accounts/:id': (call) => {
    readParams(z.strictObject({ expand: expandParam }), call.form);
    return findAccount(call.world, idOf(call));
  },
  'POST /v1/accounts/:id': (call) => {
    const { metadata: added, email, business_type: kind } = readParams(updateParams, call.form);
    const account = findAccount(call.world, idOf(call));
    const updated = call.world.state.accounts.put(account.id, {
      ...account,
      email: email ?? account.email,
      business_type: kind ?? account.business_type,
      metadata: { ...account.metadata, ...added },
    });
    call.world.emit('account.updated', updated, call.cause, updated.id);
    return updated;
  },
  'DELETE /v1/accounts/:id': close,
  'POST /v1/account_links': createLink,
};
