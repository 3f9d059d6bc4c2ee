// The kinds of photo the server takes; a phone that shoots another kind hands over a JPEG instead.
export const PHOTO_TYPES = 'image/jpeg,image/png,image/webp';
