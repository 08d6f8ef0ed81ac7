import type { EditionRow } from '../../db/repositories/editions-repository';
import type { WorkspaceRepositories } from '../../db/repositories/repositories';
import type { Outbox } from '../mail/outbox';

/** Who hears of an edition by mail. */
export class EditionMails {
  constructor(private readonly outbox: Pick<Outbox, 'post'>) {}

  /** Tells every CFO of the workspace but whoever published it. */
  async published(
    tx: WorkspaceRepositories,
    publisherId: string,
    edition: { readonly id: string; readonly number: number },
  ): Promise<void> {
    const members = await tx.members.list();
    const by = members.find(({ personId }) => personId === publisherId)?.name;
    if (by === undefined) throw new Error(`expected the publisher ${publisherId} to be a member`);
    const recipients = members
      .filter(({ personId, roles }) => roles.includes('cfo') && personId !== publisherId)
      .map(({ email }) => email);
    await this.outbox.post(tx, {
      eventKey: `edition-waiting:${edition.id}`,
      letter: 'edition-waiting',
      detail: { editionId: edition.id, number: edition.number, by },
      recipients,
    });
  }

  /** Tells the publisher, as long as they are a member. */
  async decided(
    tx: WorkspaceRepositories,
    { id, number, publishedBy }: EditionRow,
    decision: { readonly state: 'signed' | 'returned'; readonly by: string },
  ): Promise<void> {
    const publisher = await tx.members.find(publishedBy);
    const decider = await tx.members.find(decision.by);
    if (decider === undefined) throw new Error(`expected ${decision.by} to be a member`);
    if (publisher === undefined) return;
    await this.outbox.post(tx, {
      eventKey: `edition-${decision.state}:${id}`,
      letter: `edition-${decision.state}`,
      detail: { editionId: id, number, by: decider.name },
      recipients: [publisher.email],
    });
  }
}
