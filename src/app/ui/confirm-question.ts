/** What `Confirm` asks. */
export interface ConfirmQuestion {
  readonly title: string;
  /** What will happen, and whether it can be taken back. */
  readonly detail: string;
  /** The verb on the button: `Remove member`. */
  readonly action: string;
  /** A word the person has to type first, where nothing can be taken back. */
  readonly typed?: string;
}
