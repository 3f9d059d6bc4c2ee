// The endpoints of listings: search, the page of one unit, and what a lister does with a draft.
import { z } from 'zod';
import { endpoint } from '../kernel/endpoint';
import { at, cents, id, idParams, line, page, pageQuery, paragraph, version, zip } from '../kernel/fields';
import { fieldError } from '../kernel/problem';
import { photo } from '../photos/contract';
import { searchAnswer, searchQuery, unitState } from './card';
import { unitKind } from '../catalogue/kinds';
import { answers, GRADES } from './condition';
import { freightFigures } from './freight';
import { conditionReport, listingPage, listingStatus, shotEntry } from './page';
import { SHOT_CODES } from './shots';
import { terms } from './terms';

const draftFields = {
  variantId: id.nullable().optional(),
  /** Only needed where the code names no variant yet: it decides the checklist and the shots. */
  kind: unitKind.nullable().optional(),
  caseCode: z.string().trim().max(60).optional(),
  donorVehicleId: id.nullable().optional(),
  state: unitState.optional(),
  mileage: z.number().int().min(0).max(2_000_000).nullable().optional(),
  rebuilt: z.boolean().optional(),
  /** Question code to yes, no or unknown; the questions come with the draft. */
  condition: answers.optional(),
  priceCents: cents.nullable().optional(),
  terms: terms.optional(),
  freight: freightFigures.nullable().optional(),
  shipDays: z.number().int().min(0).max(60).optional(),
  notes: paragraph(2_000).optional(),
};

export const draftBody = z.strictObject({ sellerId: id, ...draftFields });
export type DraftBody = z.output<typeof draftBody>;
export const changeBody = z.strictObject({ version: version.optional(), ...draftFields });
export type ChangeBody = z.output<typeof changeBody>;

/** A listing as its seller's lister works on it. */
export const sellerListing = z.object({
  id,
  version,
  sellerId: id,
  status: listingStatus,
  kind: unitKind.nullable(),
  variantId: id.nullable(),
  familyId: id.nullable(),
  title: z.string(),
  caseCode: z.string(),
  tagCode: z.string(),
  donorVehicleId: id.nullable(),
  state: unitState,
  mileage: z.number().int().nullable(),
  rebuilt: z.boolean(),
  /** Null until the kind is known. */
  condition: conditionReport.nullable(),
  /** The answers so far, also before the kind is known. */
  answers,
  priceCents: cents.nullable(),
  totalCents: cents.nullable(),
  terms: z.object({ ...terms.shape, outrightCents: cents.nullable() }),
  freight: freightFigures.nullable(),
  shipDays: z.number().int(),
  notes: z.string(),
  zip,
  shots: z.array(shotEntry),
  photos: z.array(photo),
  coverPhotoId: id.nullable(),
  /** What still stands between this and an offer. */
  missing: z.array(fieldError),
  createdAt: at,
  updatedAt: at,
  listedAt: at.nullable(),
});
export type SellerListing = z.infer<typeof sellerListing>;

export const stockItem = z.object({
  id,
  version,
  sellerId: id,
  status: listingStatus,
  title: z.string(),
  kind: unitKind.nullable(),
  state: unitState,
  caseCode: z.string(),
  tagCode: z.string(),
  grade: z.enum(GRADES).nullable(),
  priceCents: cents.nullable(),
  depositCents: cents.nullable(),
  outrightCents: cents.nullable(),
  photoUrl: z.string().nullable(),
  photoCount: z.number().int(),
  /** Paths of what a draft still lacks; empty once it was published. */
  missing: z.array(z.string()),
  createdAt: at,
  listedAt: at.nullable(),
});
export type StockItem = z.infer<typeof stockItem>;

export const searchListings = endpoint({
  method: 'GET',
  path: '/api/listings',
  summary:
    'Units on offer. Sorting by price, minCents and maxCents go by what is paid today for the unit (price and deposit). ' +
    'Counts stop at 1000: then total.exact is false and each facet count means "at least".',
  access: 'public',
  query: searchQuery,
  answer: searchAnswer,
});

export const getListing = endpoint({
  method: 'GET',
  path: '/api/listings/:id',
  summary: 'Everything the page of one unit shows; with ?zip= the freight quote to there.',
  access: 'public',
  params: idParams,
  query: z.object({ rigId: id.optional(), zip: zip.optional() }),
  answer: listingPage,
});

export const createDraft = endpoint({
  method: 'POST',
  path: '/api/seller/listings',
  summary: 'Starts a draft; everything but the seller may come later.',
  access: 'lister',
  body: draftBody,
  answer: sellerListing,
  status: 201,
  idempotent: true,
});

export const listStock = endpoint({
  method: 'GET',
  path: '/api/seller/listings',
  summary: 'The listings of one seller account, newest first.',
  access: 'member',
  query: z.object({
    sellerId: id,
    status: listingStatus.optional(),
    q: line(60).optional(),
    ...pageQuery,
  }),
  answer: page(stockItem),
});

export const getStock = endpoint({
  method: 'GET',
  path: '/api/seller/listings/:id',
  summary: 'One listing as its seller sees it, with checklist, shots and what is still missing.',
  access: 'member',
  params: idParams,
  answer: sellerListing,
});

export const changeListing = endpoint({
  method: 'PATCH',
  path: '/api/seller/listings/:id',
  summary: 'Changes a draft. On a live listing only priceCents and notes, and with its version.',
  access: 'lister',
  params: idParams,
  body: changeBody,
  answer: sellerListing,
});

export const addListingPhoto = endpoint({
  method: 'POST',
  path: '/api/seller/listings/:id/photos',
  summary: 'Adds a photo of one shot: JPEG, PNG or WebP, at most 20 MB and 60 megapixels.',
  access: 'lister',
  params: idParams,
  body: z.strictObject({ shot: z.enum(SHOT_CODES) }),
  file: 'file',
  answer: sellerListing,
  status: 201,
  idempotent: true,
});

export const removeListingPhoto = endpoint({
  method: 'DELETE',
  path: '/api/seller/listings/:id/photos/:photoId',
  summary: 'Takes a photo off a draft.',
  access: 'lister',
  params: z.strictObject({ id, photoId: id }),
  answer: sellerListing,
});

export const reorderListingPhotos = endpoint({
  method: 'PUT',
  path: '/api/seller/listings/:id/photos/order',
  summary: 'Puts the photos in order; the first is the cover.',
  access: 'lister',
  params: idParams,
  body: z.strictObject({ photoIds: z.array(id).min(1).max(60) }),
  answer: sellerListing,
});

export const publishListing = endpoint({
  method: 'POST',
  path: '/api/seller/listings/:id/publish',
  summary: 'Puts a draft on offer, or answers 422 naming each missing shot and field.',
  access: 'lister',
  params: idParams,
  body: z.strictObject({ version: version.optional() }),
  answer: sellerListing,
});

export const withdrawListing = endpoint({
  method: 'POST',
  path: '/api/seller/listings/:id/withdraw',
  summary: 'Takes a listing off; refused while somebody holds it.',
  access: 'lister',
  params: idParams,
  body: z.strictObject({ version: version.optional() }),
  answer: sellerListing,
});

export const relistListing = endpoint({
  method: 'POST',
  path: '/api/seller/listings/:id/relist',
  summary: 'Makes a withdrawn listing a draft again.',
  access: 'lister',
  params: idParams,
  body: z.strictObject({ version: version.optional() }),
  answer: sellerListing,
});
