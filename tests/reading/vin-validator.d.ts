// The reference library carries no types.
declare module 'vin-validator' {
  export function validate(vin: string): boolean;
}
