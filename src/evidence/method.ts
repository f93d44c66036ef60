/** One method that figures of a dossier rest on, for the evidence page. */
export interface Method {
  readonly id: string;
  readonly name: string;
  /** What it yields, in a sentence. */
  readonly whatItIs: string;
  readonly source: string;
  /** Where it holds, and how far off it is known to be there. */
  readonly range: string;
}
