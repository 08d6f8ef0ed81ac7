import type { Services } from '../backend/compose';
import { ImportMapping, type Role } from '../backend/contract';
import {
  demoColumns,
  demoCurrency,
  demoOwnCompany,
  demoPanelCsv,
  demoPeerReasons,
  demoPeople,
  demoScenarios,
  demoUnit,
} from './demo-panel';

const longestFitMs = 60_000;

interface Actor {
  readonly personId: string;
  readonly workspaceId: string;
  readonly roles: readonly Role[];
}

/** Fills the demo workspace step by step; a step whose outcome exists is passed over, so that a stopped run goes on. */
export class DemoSeeder {
  constructor(
    private readonly services: Services,
    private readonly password: string,
  ) {}

  async seed(): Promise<void> {
    if (await this.#isFilled()) return;
    const founder = await this.#founder();
    for (const role of ['analyst', 'cfo', 'reader'] as const) await this.#member(founder, role);
    const analyst = await this.#actor('analyst');
    const cfo = await this.#actor('cfo');
    const panelVersionId = await this.#panel(analyst);
    const firstGroup = await this.#peerGroup(analyst, panelVersionId, 1);
    await this.#signedEdition(analyst, cfo, await this.#fit(analyst, firstGroup));
    const secondGroup = await this.#peerGroup(analyst, panelVersionId, 2);
    await this.#waitingEdition(analyst, await this.#fit(analyst, secondGroup));
  }

  /** The last step makes edition 2: with it there the demo is its users', and nothing of theirs is undone. */
  async #isFilled(): Promise<boolean> {
    const { people } = this.services.repositories;
    if ((await people.findByEmail(person('analyst').email)) === undefined) return false;
    const analyst = await this.#actor('analyst');
    const editions = await this.services.editions.list(analyst);
    return editions.some((edition) => edition.number >= 2);
  }

  async #founder(): Promise<Actor> {
    const { accounts, members } = this.services;
    const { name, email } = person('billing_admin');
    if ((await this.services.repositories.people.findByEmail(email)) === undefined) {
      const workspaceName = `${demoOwnCompany} Flow Control`;
      await accounts.signUp({ name, email, password: this.password, workspaceName });
    }
    const founder = await this.#actor('billing_admin');
    const { workspaceId, personId } = founder;
    await members.changeRoles(workspaceId, personId, personId, ['billing_admin']);
    return founder;
  }

  async #member(founder: Actor, role: Role): Promise<void> {
    const { members } = this.services;
    const { name, email } = person(role);
    const found = await members.list(founder.workspaceId);
    if (found.members.some((member) => member.email === email)) return;
    for (const open of found.invitations.filter((invitation) => invitation.email === email))
      await members.withdraw(founder.workspaceId, founder.personId, open.id);
    const { token } = await members.invite(founder.workspaceId, founder.personId, email, [role]);
    await members.accept(token, name, this.password);
  }

  async #actor(role: Role): Promise<Actor> {
    const found = await this.services.repositories.people.findByEmail(person(role).email);
    if (found === undefined) throw new Error(`the demo has nobody with role ${role}`);
    const [membership] = await this.services.repositories.membershipsOf(found.id);
    if (membership === undefined) throw new Error(`the demo’s ${role} belongs to no workspace`);
    return { personId: found.id, workspaceId: membership.workspaceId, roles: [role] };
  }

  async #panel(analyst: Actor): Promise<string> {
    const { imports, commits, panels } = this.services;
    const existing = (await panels.list(analyst.workspaceId))[0];
    if (existing !== undefined) return existing.id;
    const csv = Buffer.from(demoPanelCsv());
    const draft = await imports.upload(analyst, 'flow-control-peers-FY2025.csv', csv);
    const mapping = ImportMapping.parse({
      panelName: 'Flow control peers',
      ...demoColumns,
      currency: demoCurrency,
      unit: demoUnit,
    });
    await imports.check(analyst.workspaceId, draft.id, mapping);
    return commits.finish(
      analyst,
      draft.id,
      'Annual reports up to FY2025; market value at each fiscal year end.',
    );
  }

  /** Version 1 takes everybody in; version 2 leaves out who cannot be compared. */
  async #peerGroup(analyst: Actor, panelVersionId: string, number: 1 | 2): Promise<string> {
    const { peers } = this.services;
    const existing = await peers.list(analyst.workspaceId);
    const found = existing.find((group) => group.number === number);
    if (found !== undefined) return found.id;
    const saved = await peers.save(analyst, {
      panelVersionId,
      ownCompany: demoOwnCompany,
      parentId: existing.find((group) => group.number === number - 1)?.id ?? null,
      note:
        number === 1
          ? 'All listed companies of the industry.'
          : 'Zethorin out after review with group accounting.',
      peers: Object.entries(demoPeerReasons).map(([company, { included, reason }]) => ({
        company,
        isIncluded: included || number === 1,
        reason:
          number === 1 && !included
            ? 'Listed in the same industry index; comparability of its equity still to be reviewed.'
            : reason,
      })),
    });
    return saved.id;
  }

  async #fit(analyst: Actor, peerGroupId: string): Promise<string> {
    const { fits } = this.services;
    const request = {
      peerGroupId,
      effects: 'company',
      form: 'levels',
      lag: 0,
      slopes: 'cr2',
      confidence: 0.95,
      furtherRegressors: [],
    } as const;
    const started = await fits.start(analyst, request);
    const until = Date.now() + longestFitMs;
    while (Date.now() < until) {
      const { fit } = await fits.find(analyst.workspaceId, started.fit.id);
      if (fit.state === 'done') return fit.id;
      if (fit.state === 'failed' || fit.state === 'cancelled')
        throw new Error(`the demo’s fit ended ${fit.state}: ${fit.failure?.detail ?? ''}`);
      await new Promise((resolve) => setTimeout(resolve, 100));
    }
    throw new Error('the demo’s fit did not end in time');
  }

  async #signedEdition(analyst: Actor, cfo: Actor, fitId: string): Promise<void> {
    const { editions } = this.services;
    const first = (await editions.list(analyst)).find((edition) => edition.number === 1);
    const id =
      first?.id ??
      (await editions.publish(analyst, {
        fitId,
        scenarios: [],
        confidentiality: 'confidential',
        comment: 'First reading for the audit committee, before the review of the peer group.',
        ...asMade,
      }));
    if (first !== undefined && first.state !== 'waiting') return;
    await this.#openWarnings(cfo, id);
    await editions.sign(cfo, id, this.password);
  }

  /** As whoever signs has to. */
  async #openWarnings(cfo: Actor, editionId: string): Promise<void> {
    const { editionDesk } = this.services;
    for (const warningId of await editionDesk.seriousWarnings(cfo, editionId))
      await editionDesk.openWarning(cfo, editionId, warningId);
  }

  async #waitingEdition(analyst: Actor, fitId: string): Promise<void> {
    const { editions, scenarios } = this.services;
    let saved = await scenarios.list(analyst.workspaceId, fitId);
    for (const { name, note, years } of demoScenarios) {
      if (saved.some((scenario) => scenario.name === name)) continue;
      const plan = years.map(({ year, capex, bookEquity }) => ({
        year,
        values: [capex, bookEquity],
      }));
      await scenarios.save(analyst, fitId, { name, note, plan });
    }
    if ((await editions.list(analyst)).some((edition) => edition.number === 2)) return;
    saved = await scenarios.list(analyst.workspaceId, fitId);
    await editions.publish(analyst, {
      fitId,
      scenarios: saved.map(({ id, version }) => ({ id, version })),
      confidentiality: 'inside-information',
      comment:
        'Peer group reviewed: Zethorin is out. Both capex plans of the November budget are read through the model.',
      ...asMade,
    });
  }
}

/** The headline as it is made from the figures. */
const asMade = { headline: null, unit: 'millions', answersEditionId: null } as const;

function person(role: Role): { readonly name: string; readonly email: string } {
  const found = demoPeople.find((candidate) => candidate.role === role);
  if (found === undefined) throw new Error(`the demo has nobody with role ${role}`);
  return found;
}
