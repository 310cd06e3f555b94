import { issueUnsubscribeToken } from "#server/auth/unsubscribe-tokens.ts";
import { newId } from "#server/db/new-id.ts";
import { Artwork } from "#server/models/artwork.ts";
import { OutgoingMail } from "#server/models/outgoing-mail.ts";
import { Session } from "#server/models/session.ts";
import { changeJob, openJob, setConsent } from "#shared/contracts/jobs.ts";
import { saveMockup } from "#shared/contracts/mockups.ts";
import { keepDraft } from "#shared/contracts/named-drafts.ts";
import { addNote, replyToNote } from "#shared/contracts/notes.ts";
import { listOutgoingMail } from "#shared/contracts/outgoing-mail.ts";
import { makeShareLink } from "#shared/contracts/portfolio.ts";
import { approveRevision, getRevision, getSheet, type Revision } from "#shared/contracts/revisions.ts";
import { setAsideFinding } from "#shared/contracts/set-asides.ts";
import { inviteMember } from "#shared/contracts/shop.ts";
import { listStock } from "#shared/contracts/stock.ts";
import { boundFinding } from "#shared/dry-fit/set-aside.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { TestApp } from "./app.ts";
import { buildLayer, buildSign, plate } from "./build-sign.ts";
import { dryFitOf } from "./dry-fit.ts";
import { buildClient, buildContact } from "./factories/client.ts";
import { buildMember } from "./factories/member.ts";
import { buildPerson } from "./factories/person.ts";
import { unique } from "./factories/unique.ts";
import { buildWallPhoto } from "./factories/wall-photo.ts";
import {
  buildArtwork,
  buildPicture,
  buildRevision,
  buildWorld,
  signFromArtwork,
  type World,
} from "./factories/work.ts";
import { type ActorName, actors } from "./policy-table.ts";
import { signInAs, signInByMail } from "./sign-in.ts";
import type { Visitor } from "./visitor.ts";

/** One shop with something of everything that a route can name, and everyone who might ask for it. */
export type PolicyWorld = Awaited<ReturnType<typeof buildPolicyWorld>>;

export async function buildPolicyWorld(app: TestApp) {
  const world = await buildWorld(app);
  const { params, visitors, approver, owner } = world;
  const clientId = approver.client.id;
  const main = await buildArtwork(app, world);
  const picture = await buildPicture(app, world);
  const issued = await buildRevision(app, world, { document: await signFromArtwork(world, main.id) });
  const note = await visitors.approver.get(addNote, {
    params: { ...params, revisionId: issued.id },
    body: { text: "Wider?", kind: "must change", anchor: { on: "whole" } },
  });
  const { replies } = await visitors.approver.get(replyToNote, {
    params: { ...params, noteId: note.id },
    body: { text: "By a hand." },
  });

  const issuedOnNewJob = async (title: string): Promise<{ world: World; revision: Revision }> => {
    const opened = await visitors.owner.get(openJob, { params, body: { clientId, title, dueOn: "2031-05-06" } });
    const job = await visitors.owner.get(changeJob, {
      params: { ...params, jobId: opened.id },
      body: { brief: world.job.brief, approverIds: [approver.contact.id] },
    });
    const own = { ...world, job };
    return { world: own, revision: await buildRevision(app, own) };
  };
  const toWithdraw = await issuedOnNewJob("To withdraw");
  const toAsk = await issuedOnNewJob("To ask");
  const toApprove = await issuedOnNewJob("To approve");
  const toMove = await issuedOnNewJob("To move");
  const showable = await issuedOnNewJob("To show");
  const acknowledgedIds = await acknowledgementsOf(visitors.approver, params, showable.revision.id);
  await visitors.approver.get(approveRevision, {
    params: { ...params, revisionId: showable.revision.id },
    body: { typedName: "A. Person", acknowledgedIds, pdfSha256: showable.revision.pdfSha256 ?? "" },
  });
  await visitors.approver.get(setConsent, {
    params: { ...params, jobId: showable.world.job.id },
    body: { given: true },
  });
  await app.runJobs();
  const toSave = await visitors.owner.get(openJob, { params, body: { clientId, title: "To save" } });

  const toFit = await jobWithFindings(visitors.owner, params, clientId);

  const shareLink = async () =>
    visitors.owner.get(makeShareLink, { params, body: { label: "A link", jobIds: [showable.world.job.id], days: 7 } });
  const live = await shareLink();
  const spare = await shareLink();
  const invitation = await visitors.owner.get(inviteMember, {
    params,
    body: { email: `invited${unique()}@people.example`, role: "rep" },
  });
  const spareMember = await buildMember({ shop: owner.shop, role: "rep" });
  const mails = await visitors.owner.get(listOutgoingMail, { params });
  const stockItemOf = async (kind: "adhesive" | "screw") =>
    (await visitors.owner.get(listStock, { params, query: { kind, limit: 1 } })).items[0]?.id ?? "";
  const someone = await buildPerson();
  await signInAs(app, someone);
  const someonesSession = await Session.findOne({ where: { personId: someone.id }, rejectOnEmpty: true });

  const unsubscribeToken = await app.services.sequelize.transaction((transaction) =>
    issueUnsubscribeToken(
      app.services.env,
      { personId: someone.id, shopId: owner.shop.id },
      { now: new Date(), transaction },
    ),
  );

  const otherShop = await buildMember();
  const askers: Readonly<Record<ActorName, Visitor>> = {
    owner: visitors.owner,
    maker: visitors.maker,
    rep: visitors.rep,
    approver: visitors.approver,
    "other contact": visitors.otherContact,
    "contact of another client": await signInByMail(
      app,
      await buildContact({ client: await buildClient({ shop: owner.shop }) }),
    ),
    "owner of another shop": await signInAs(app, otherShop),
    "contact of another shop": await signInByMail(
      app,
      await buildContact({ client: await buildClient({ shop: otherShop.shop }) }),
    ),
    nobody: app.visitor(),
  };
  const document: MockupDocument = buildSign([]);
  const draft = async () => {
    const body = { name: `Draft ${unique()}`, document };
    return (await visitors.maker.get(keepDraft, { params: { ...params, jobId: world.job.id }, body })).id;
  };
  return {
    params,
    askers,
    clientId,
    jobId: world.job.id,
    revisionId: issued.id,
    certifiedRevisionId: showable.revision.id,
    showableJobId: showable.world.job.id,
    toWithdrawRevisionId: toWithdraw.revision.id,
    toAskRevisionId: toAsk.revision.id,
    toApproveRevisionId: toApprove.revision.id,
    toApprovePdfSha256:
      (await visitors.owner.get(getRevision, { params: { ...params, revisionId: toApprove.revision.id } })).pdfSha256 ??
      "",
    toMoveJobId: toMove.world.job.id,
    toSaveJobId: toSave.id,
    toFit,
    acknowledgedIds,
    artworkId: main.id,
    pictureId: picture.id,
    draftId: await draft(),
    draftIdsToRemove: await eachTime(draft),
    noteId: note.id,
    replyId: replies[0]?.id ?? "",
    invitationId: invitation.id,
    spareMemberId: spareMember.membership.id,
    spareContactId: (await buildContact({ client: approver.client })).contact.id,
    /** One for each who asks to have it removed, since it is gone after the first who may. */
    contactIdsToRemove: await eachTime(async () => (await buildContact({ client: approver.client })).contact.id),
    artworkIdsToRemove: await eachTime(() => copyOfArtwork(main.id)),
    photoId: (await buildWallPhoto(world)).id,
    photoIdsToRemove: await eachTime(async () => (await buildWallPhoto(world)).id),
    mailId: mails.items[0]?.id ?? "",
    adhesiveId: await stockItemOf("adhesive"),
    screwId: await stockItemOf("screw"),
    someoneElsesSessionId: someonesSession.id,
    liveShareToken: tokenOf(live.url),
    unsubscribeToken,
    refusedMailIds: await eachTime(() => refusedMail(world)),
    spareShareLinkId: spare.link.id,
    document,
    next: unique,
  };
}

/** A job whose saved draft has two findings: one to set aside, and one that is. */
async function jobWithFindings(owner: Visitor, params: World["params"], clientId: string) {
  const { id: jobId, brief } = await owner.get(openJob, { params, body: { clientId, title: "To fit" } });
  const document = buildSign(
    ["B", "C"].map((key, index) => {
      const [x, y] = [150 + 250 * index, 200] as const;
      return buildLayer(key, [plate(`p${key}`, 90, 40, [x, y])], { locate: "none" });
    }),
  );
  await owner.get(saveMockup, { params: { ...params, jobId }, body: { version: 0, document } });
  const findings = await dryFitOf(document, { context: { words: brief.words } });
  const [finding, other] = findings.filter(({ rule }) => rule === 20).map(boundFinding);
  if (!finding || !other) throw new Error("Nothing is found on this sign.");
  const body = { mockupVersion: 1, finding: other, reason: "A jig finds the place" };
  const { id: setAsideId } = await owner.get(setAsideFinding, { params: { ...params, jobId }, body });
  return { jobId, finding, setAsideId };
}

/** As many as there are actors. */
async function eachTime(make: () => Promise<string>): Promise<string[]> {
  const ids: string[] = [];
  for (const _ of actors) ids.push(await make());
  return ids;
}

/** A proof mail that the mail server refused. */
async function refusedMail({ job, owner, approver }: World): Promise<string> {
  const row = { shopId: owner.shop.id, jobId: job.id, kind: "proof issued" as const, recipientId: approver.person.id };
  const data = { contactId: approver.contact.id };
  const refused = { ...row, address: approver.email, data, state: "refused" as const, createdAt: new Date() };
  return (await OutgoingMail.create({ id: newId(), ...refused })).id;
}

async function copyOfArtwork(artworkId: string): Promise<string> {
  const { shopId, jobId, fileId, addedBy } = await Artwork.findByPk(artworkId, { rejectOnEmpty: true });
  const row = { shopId, jobId, fileId, addedBy, name: "copy.svg", state: "importing" as const, addedAt: new Date() };
  return (await Artwork.create({ id: newId(), ...row })).id;
}

const tokenOf = (url: string): string => url.split("/").at(-1) ?? "";

async function acknowledgementsOf(visitor: Visitor, params: World["params"], revisionId: string): Promise<string[]> {
  const sheet = await visitor.get(getSheet, { params: { ...params, revisionId } });
  return sheet.acknowledgements.map(({ id }) => id);
}
