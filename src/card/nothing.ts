/** A line that says the same whatever the numbers. */
export type Nothing = Readonly<Record<string, never>>;
