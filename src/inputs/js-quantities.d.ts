/** The part of js-quantities that trackworth uses; the package ships no types. */
declare module 'js-quantities/esm' {
  interface Quantity {
    /** `length`, `speed`, `power`, `angle`, `time` ... */
    kind(): string;
    to(unit: string): { readonly scalar: number };
  }
  /** Throws where the unit is not known. */
  const Qty: (amount: number, unit: string) => Quantity;
  export default Qty;
}
