/** A name and the number that stands under it. */
export type Named = { readonly name: string; readonly value: string };

/** What a person reads in each picture; chosen and formatted by the phrase book. */
export type WordsOf = {
  readonly toothForm: {
    readonly title: string;
    readonly crest: Named;
    readonly blank: Named;
    readonly rise: Named | null;
    readonly infeed: Named;
    readonly height: Named;
    readonly pitch: Named;
    readonly flat: Named;
    readonly wheel: string;
    readonly shown: (teeth: number) => string;
  };
  readonly trackingStrip: {
    readonly title: string;
    readonly count: (teeth: number) => string;
    readonly diameter: (value: number) => string;
    readonly window: string;
    readonly marks: readonly string[];
    readonly expected: string | null;
    readonly next: string | null;
    readonly broken: string;
  };
  readonly setupSketch: {
    readonly title: string;
    readonly length: string;
    readonly stickout: string | null;
    readonly chamfer: string;
    readonly travel: string;
    readonly nip: string;
    readonly wheel: string;
    readonly cutOut: string;
    readonly notToScale: string;
  };
  readonly developedPattern: {
    readonly title: string;
    readonly first: string;
    readonly second: string | null;
    readonly rings: string | null;
    readonly angle: string;
    readonly pitch: string;
    readonly shown: (teeth: number) => string;
  };
  readonly planMap: {
    readonly title: string;
    readonly diameter: (value: number) => string;
    readonly diameterAxis: string;
    readonly fill: (value: number) => string;
    readonly fillAxis: string;
    readonly band: string;
    readonly states: string;
    readonly candidates: readonly string[];
  };
  readonly shopRecord: {
    readonly title: string;
    readonly families: readonly Named[];
    readonly share: (value: number) => string;
    readonly measured: string;
    readonly doubted: string;
    readonly beyond: string;
    readonly expected: string;
    readonly prior: string;
    readonly axis: string;
    readonly more: (families: number) => string;
  };
};
