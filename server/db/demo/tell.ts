import type { Actor } from '@/server/auth/actor';
import { readActor } from '@/server/auth/actor';
import { CaseModel } from '@/server/db/models/CaseModel';
import { CommentModel } from '@/server/db/models/CommentModel';
import { ReviewQueryModel } from '@/server/db/models/ReviewQueryModel';
import type { attachmentService } from '@/server/features/attachments/service';
import type { CaseDeps } from '@/server/features/cases/deps';
import { remarkService } from '@/server/features/cases/remarks';
import { caseService } from '@/server/features/cases/service';
import { contentOf, presentRevision } from '@/server/features/cases/store';
import { inTransaction } from '@/server/db/transaction';
import { reviewService } from '@/server/features/reviews/service';
import type { CaseContent } from '@/shared/types/case';

import { demoFile } from './files';
import { DEMO_PASSWORD } from './people';
import type { DemoAct, DemoCase, Moment, PersonKey, ProjectKey } from './story';

export interface Stage {
  deps: CaseDeps;
  attachments: Pick<ReturnType<typeof attachmentService>, 'add'>;
  /** moves the clock that `deps.now` reads */
  setClock: (at: Date) => void;
  /** waits for the mails of the act */
  settleMail: () => Promise<void>;
  instant: (moment: Moment) => Date;
  day: (inDays: number) => string;
  origin: string;
  personIds: Record<PersonKey, string>;
  projectIds: Record<ProjectKey, string>;
}

interface Step {
  at: Date;
  one: DemoCase;
  act: DemoAct | 'open';
}

/** Every act of every case in the order of time, so that numbers, revisions and the log read as they would have grown. */
function stepsOf(cases: readonly DemoCase[], instant: Stage['instant']): Step[] {
  const steps = cases.flatMap((one): Step[] => [
    ...(one.opened === null ? [] : [{ at: instant(one.opened), one, act: 'open' as const }]),
    ...one.acts.map((act) => ({ at: instant(act.at), one, act })),
  ]);
  // acts of one case never change places even where two fall on the same minute: the sort is stable
  return steps.sort((a, b) => a.at.getTime() - b.at.getTime());
}

/** Plays the story through the services that people use, under every rule they are under. */
export async function tellStory(stage: Stage, cases: readonly DemoCase[]): Promise<void> {
  const ids = new Map<string, string>();
  const byKey = new Map(cases.map((one) => [one.key, one]));
  for (const { at, one, act } of stepsOf(cases, stage.instant)) {
    stage.setClock(at);
    try {
      await play(stage, ids, byKey, one, act);
    } catch (error) {
      throw new Error(`The demo case "${one.key}" cannot be told at its act "${act === 'open' ? act : act.act}".`, { cause: error });
    }
    await stage.settleMail();
  }
}

async function play(stage: Stage, ids: Map<string, string>, byKey: ReadonlyMap<string, DemoCase>, one: DemoCase, act: DemoAct | 'open'): Promise<void> {
  const { deps, origin } = stage;
  const cases = caseService(deps);
  const reviews = reviewService(deps);
  const remarks = remarkService(deps);
  if (act === 'open') {
    const who = await person(stage, one.author);
    const caseId = await cases.create(who, { projectId: stage.projectIds[one.project], question: one.content.question, compoundName: one.content.compound.name });
    ids.set(one.key, caseId);
    await save(stage, who, caseId, () => one.content, undefined);
    return;
  }
  const caseId = ids.get(one.key);
  if (caseId === undefined) throw new Error('the case is not open yet');
  const who = await person(stage, 'by' in act && act.by !== undefined ? act.by : one.author);
  const { version: seenVersion, contentHash, revision } = await CaseModel.findByPk(caseId, { rejectOnEmpty: true });
  const query = async (number: number): Promise<string> => (await ReviewQueryModel.findOne({ where: { caseId, number }, rejectOnEmpty: true })).id;
  switch (act.act) {
    case 'save':
      return save(stage, who, caseId, act.change, act.reason);
    case 'attach': {
      const { name, bytes } = demoFile(act.file);
      const { id } = await stage.attachments.add(who, caseId, name, bytes);
      return save(stage, who, caseId, (content) => ({
        ...content, evidence: content.evidence.map((entry) => (entry.id === act.evidenceId ? { ...entry, attachmentIds: [...entry.attachmentIds, id] } : entry)),
      }), act.reason);
    }
    case 'comment': {
      await remarks.comment(who, caseId, { target: act.target, text: act.text }, { origin });
      if (act.resolvedBy === undefined) return;
      const comment = await CommentModel.findOne({ where: { caseId }, order: [['at', 'DESC']], rejectOnEmpty: true });
      await remarks.resolve(await person(stage, act.resolvedBy), comment.id, true);
      return;
    }
    case 'submit':
      return cases.submit(who, caseId, { seenVersion, dueOn: act.dueInDays === undefined ? null : stage.day(act.dueInDays), password: DEMO_PASSWORD }, { origin });
    case 'reopen':
      return cases.reopen(who, caseId, { seenVersion });
    case 'claim':
      return reviews.claim(who, caseId);
    case 'check':
      for (const step of act.steps) await reviews.check(who, caseId, { step, checked: true, revision });
      return;
    case 'query':
      return reviews.openQuery(who, caseId, { step: act.step, text: act.text }, { origin });
    case 'reply':
      await reviews.reply(who, await query(act.query), act.text, { origin });
      return;
    case 'close':
      await reviews.close(who, await query(act.query), act.text);
      return;
    case 'sign':
      return reviews.sign(who, caseId, { seenVersion, contentHash, meaning: act.meaning, password: DEMO_PASSWORD }, { origin });
    case 'addendum':
      return remarks.addend(who, caseId, { text: act.text, password: DEMO_PASSWORD });
    case 'withdraw':
      return cases.withdraw(who, caseId, { seenVersion, reason: act.reason });
    case 'supersede': {
      const next = byKey.get(act.successor);
      if (next === undefined) throw new Error(`there is no case "${act.successor}"`);
      const nextId = await cases.supersede(who, caseId, { seenVersion, reason: act.reason });
      ids.set(act.successor, nextId);
      return save(stage, who, nextId, () => next.content, undefined);
    }
  }
}

async function person({ deps, personIds }: Stage, key: PersonKey): Promise<Actor> {
  const who = await readActor(deps.db, personIds[key], 0, deps.now());
  if (who === null) throw new Error(`${key} has no account`);
  return who;
}

async function save({ deps }: Stage, who: Actor, caseId: string, change: (content: CaseContent) => CaseContent, reason: string | undefined): Promise<void> {
  const found = await CaseModel.findByPk(caseId, { rejectOnEmpty: true });
  const before = contentOf(await inTransaction(deps.db, (tx) => presentRevision(found, tx)));
  await caseService(deps).save(who, caseId, { seenVersion: found.version, content: change(before), reason });
}
