/** What became of an effect on the platform. */
export type Delivery =
  | { readonly delivered: true; readonly outcome: unknown }
  | {
      readonly delivered: false;
      /** What the platform said, without anything secret. */
      readonly fault: string;
      /** It will never be taken: no such channel, no permission. */
      readonly final: boolean;
    };

/** What is known of an effect besides itself. */
export type Delivering = {
  /** The platform's own id of the shop. */
  readonly shop: string;
  /** What came of the effect this one waited for. */
  readonly earlier: unknown;
  /** When it was first tried, where this is not the first time: it may stand already. */
  readonly firstTried: number | null;
};
