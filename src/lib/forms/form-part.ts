/** What a page hands to the form of a thing that a farm keeps. */
export interface FormPart<Item, Body> {
  /** What is edited; null for a new one. */
  stored: Item | null;
  /** Sends the body and, on success, leads away. */
  save: (body: Body) => Promise<unknown>;
  cancelTo: string;
}
