import * as account from "#shared/contracts/account.ts";
import * as anotherLike from "#shared/contracts/another-like.ts";
import * as artworks from "#shared/contracts/artworks.ts";
import * as clients from "#shared/contracts/clients.ts";
import type { Endpoint } from "#shared/contracts/endpoint.ts";
import * as jobSignals from "#shared/contracts/job-signals.ts";
import * as jobs from "#shared/contracts/jobs.ts";
import * as limits from "#shared/contracts/limits.ts";
import * as mailChoices from "#shared/contracts/mail-choices.ts";
import * as mockups from "#shared/contracts/mockups.ts";
import * as namedDrafts from "#shared/contracts/named-drafts.ts";
import * as notes from "#shared/contracts/notes.ts";
import * as outgoingMail from "#shared/contracts/outgoing-mail.ts";
import * as portfolio from "#shared/contracts/portfolio.ts";
import * as prices from "#shared/contracts/prices.ts";
import * as revisionDocuments from "#shared/contracts/revision-documents.ts";
import * as revisions from "#shared/contracts/revisions.ts";
import * as saws from "#shared/contracts/saws.ts";
import * as setAsides from "#shared/contracts/set-asides.ts";
import * as shop from "#shared/contracts/shop.ts";
import * as stock from "#shared/contracts/stock.ts";
import * as system from "#shared/contracts/system.ts";
import * as wallPhotos from "#shared/contracts/wall-photos.ts";
import { emptyPriceBook } from "#shared/cost/works.ts";
import { usualSaws } from "#shared/cut-plan/shop-saws.ts";
import { defaultLimits } from "#shared/dry-fit/limits.ts";
import { firstChoices } from "#shared/tracing/trace-choices.ts";
import type { PolicyWorld } from "./policy-world.ts";

/** Who asks, in the order of the table's columns. */
export const actors = [
  "owner",
  "maker",
  "rep",
  "approver",
  "other contact",
  "contact of another client",
  "owner of another shop",
  "contact of another shop",
  "nobody",
] as const;
export type ActorName = (typeof actors)[number];

/** y: may. n: sees it but may not (not_allowed). -: not found. o: asked to sign in. */
export type Verdict = "y" | "n" | "-" | "o";

export type PolicyRow = {
  readonly endpoint: Endpoint;
  /** A verdict an actor. */
  readonly verdicts: string;
  readonly given?: (world: PolicyWorld) => { params?: unknown; query?: unknown; body?: unknown };
};

const row = (endpoint: Endpoint, verdicts: string, given?: PolicyRow["given"]): PolicyRow =>
  given ? { endpoint, verdicts, given } : { endpoint, verdicts };

const anyone = "y y y y y y y y y";
const signedIn = "y y y y y y y y o";
const staff = "y y y - - - - - o";
const staffOnVisible = "y y y n n - - - o";
const insiders = "y y y y y y - - o";
const owners = "y - - - - - - - o";
const makers = "y y n - - - - - o";
const makersOnVisible = "y y n n n - - - o";
const readers = "y y y y y - - - o";
const approvers = "n n n y n - - - o";

const job = (world: PolicyWorld) => ({ params: { ...world.params, jobId: world.jobId } });
const revision = (world: PolicyWorld) => ({ params: { ...world.params, revisionId: world.revisionId } });
const picture = (world: PolicyWorld) => ({ params: { ...world.params, artworkId: world.pictureId } });
const artwork = (world: PolicyWorld) => ({ params: { ...world.params, artworkId: world.artworkId } });
const draft = (world: PolicyWorld) => ({ params: { ...world.params, jobId: world.jobId, draftId: world.draftId } });
const inShop = (world: PolicyWorld) => ({ params: world.params });
const epoxyNamed = (name: string) => ({ kind: "adhesive", adhesive: { name, family: "epoxy" } });
const unknownToken = "A".repeat(43);

/** PRODUCT's "who may do what", a line a route. */
export const policyTable: readonly PolicyRow[] = [
  row(system.health, anyone),
  row(system.ready, anyone),
  row(system.openApi, anyone),
  row(account.whoAmI, anyone),
  row(account.registerShop, anyone, (world) => ({
    body: {
      shopName: "A shop",
      name: "A person",
      email: `new${world.next()}@people.example`,
      password: "a long enough password",
    },
  })),
  row(account.inspectLink, anyone, () => ({ body: { token: unknownToken } })),
  row(account.sendFreshLink, anyone, () => ({ body: { token: unknownToken } })),
  row(account.requestLink, anyone, () => ({ body: { email: "nobody@people.example" } })),
  row(account.forgotPassword, anyone, () => ({ body: { email: "nobody@people.example" } })),
  // Whoever holds a token may use it; one that was never made is not found, whoever asks.
  row(account.acceptInvitation, "- - - - - - - - -", () => ({
    body: { token: unknownToken, name: "A", password: "a long enough password" },
  })),
  row(account.resetPassword, "- - - - - - - - -", () => ({
    body: { token: unknownToken, password: "a long enough password" },
  })),
  row(account.changeAccount, signedIn, (world) => ({ body: { name: `Name ${world.next()}` } })),
  row(account.changePassword, signedIn, () => ({
    body: { current: "not the password", password: "a long enough password" },
  })),
  row(account.listSessions, signedIn),
  row(account.endSession, "- - - - - - - - o", (world) => ({ params: { sessionId: world.someoneElsesSessionId } })),

  row(mailChoices.listMailChoices, signedIn),
  row(mailChoices.changeMailChoices, insiders, (world) => ({ ...inShop(world), body: { reminders: true } })),
  // Whoever holds the token of a mail stops that reader's mails, and can do nothing else with it.
  row(mailChoices.inspectUnsubscribe, anyone, (world) => ({ body: { token: world.unsubscribeToken } })),
  row(mailChoices.unsubscribe, anyone, (world) => ({ params: { token: world.unsubscribeToken } })),

  row(shop.getShop, insiders, inShop),
  row(shop.changeShop, "y n n n n n - - o", (world) => ({ ...inShop(world), body: { paper: "A4" } })),
  row(shop.listMembers, owners, inShop),
  row(shop.listInvitations, owners, inShop),
  row(shop.inviteMember, owners, (world) => ({
    ...inShop(world),
    body: { email: `invited${world.next()}@people.example`, role: "rep" },
  })),
  row(shop.revokeInvitation, owners, (world) => ({ params: { ...world.params, invitationId: world.invitationId } })),
  row(shop.changeMember, owners, (world) => ({
    params: { ...world.params, memberId: world.spareMemberId },
    body: { role: "maker" },
  })),
  row(shop.removeMember, owners, (world) => ({ params: { ...world.params, memberId: world.spareMemberId } })),

  row(limits.getLimits, staff, inShop),
  row(limits.changeLimits, "y n n - - - - - o", (world) => ({
    ...inShop(world),
    body: { version: 0, limits: defaultLimits },
  })),

  row(saws.getSaws, staff, inShop),
  row(saws.changeSaws, makers, (world) => ({ ...inShop(world), body: { version: 0, saws: usualSaws } })),

  row(prices.getPrices, "y y - - - - - - o", inShop),
  row(prices.changePrices, "y n - - - - - - o", (world) => ({
    ...inShop(world),
    body: { version: 0, book: emptyPriceBook("EUR") },
  })),

  row(clients.listClients, staff, inShop),
  row(clients.getClient, staff, (world) => ({ params: { ...world.params, clientId: world.clientId } })),
  row(clients.addClient, staff, (world) => ({ ...inShop(world), body: { name: `Client ${world.next()}` } })),
  row(clients.changeClient, staff, (world) => ({
    params: { ...world.params, clientId: world.clientId },
    body: { remarks: "Early deliveries." },
  })),
  row(clients.addContact, staff, (world) => ({
    params: { ...world.params, clientId: world.clientId },
    body: { name: "A contact", email: `contact${world.next()}@people.example` },
  })),
  row(clients.changeContact, staff, (world) => ({
    params: { ...world.params, contactId: world.spareContactId },
    body: { name: "Another name" },
  })),
  row(clients.inviteContact, staff, (world) => ({ params: { ...world.params, contactId: world.spareContactId } })),
  row(clients.removeContact, staff, (world) => ({
    params: { ...world.params, contactId: world.contactIdsToRemove.pop() },
  })),

  row(outgoingMail.listOutgoingMail, owners, inShop),
  row(outgoingMail.getOutgoingMail, owners, (world) => ({ params: { ...world.params, mailId: world.mailId } })),

  row(outgoingMail.listJobMails, staff, job),
  row(outgoingMail.sendMailAgain, staff, (world) => ({
    params: { ...world.params, jobId: world.jobId, mailId: world.refusedMailIds.pop() },
  })),

  row(jobs.listJobs, insiders, inShop),
  row(jobs.getJob, readers, job),
  row(jobs.openJob, "y y y n n n - - o", (world) => ({
    ...inShop(world),
    body: { clientId: world.clientId, title: "Another sign" },
  })),
  row(anotherLike.openAnotherLike, staffOnVisible, (world) => ({
    ...job(world),
    body: { clientId: world.clientId, title: "Another sign", words: "OTHER WORDS" },
  })),
  row(jobs.changeJob, staffOnVisible, (world) => ({ ...job(world), body: { title: "Lobby sign" } })),
  row(jobs.moveJob, makersOnVisible, (world) => ({
    params: { ...world.params, jobId: world.toMoveJobId },
    body: { to: "cancelled" },
  })),
  row(jobs.setConsent, "n n n y y - - - o", (world) => ({ ...job(world), body: { given: true } })),
  row(jobs.listEvents, staff, job),
  row(jobSignals.streamJobSignals, readers, (world) => ({ ...job(world), query: { once: "1" } })),

  row(artworks.listArtworks, staff, job),
  row(artworks.addArtwork, makers, job),
  row(artworks.getArtwork, staff, artwork),
  row(artworks.getArtworkPieces, staff, artwork),
  row(artworks.getArtworkFile, staff, artwork),
  row(artworks.setTrueSize, makers, (world) => ({ ...artwork(world), body: { side: "width", lengthMm: 200 } })),
  row(artworks.traceArtwork, makers, (world) => ({ ...picture(world), body: firstChoices })),
  row(artworks.cancelTrace, makers, picture),
  row(artworks.removeArtwork, makers, (world) => ({
    params: { ...world.params, artworkId: world.artworkIdsToRemove.pop() },
  })),

  row(wallPhotos.listWallPhotos, staff, job),
  row(wallPhotos.addWallPhoto, makers, job),
  row(wallPhotos.getWallPhotoFile, staff, (world) => ({ params: { ...world.params, photoId: world.photoId } })),
  row(wallPhotos.removeWallPhoto, makers, (world) => ({
    params: { ...world.params, photoId: world.photoIdsToRemove.pop() },
  })),

  row(mockups.getMockup, staff, job),
  row(mockups.saveMockup, makers, (world) => ({
    params: { ...world.params, jobId: world.toSaveJobId },
    body: { version: 0, document: world.document },
  })),

  row(namedDrafts.listDrafts, staff, job),
  row(namedDrafts.keepDraft, makers, (world) => ({
    ...job(world),
    body: { name: `Draft ${world.next()}`, document: world.document },
  })),
  row(namedDrafts.getDraft, staff, draft),
  row(namedDrafts.renameDraft, makers, (world) => ({ ...draft(world), body: { name: `Draft ${world.next()}` } })),
  row(namedDrafts.removeDraft, makers, (world) => ({
    params: { ...world.params, jobId: world.jobId, draftId: world.draftIdsToRemove.pop() },
  })),

  row(setAsides.listSetAsides, staff, job),
  row(setAsides.setAsideFinding, makers, (world) => ({
    params: { ...world.params, jobId: world.toFit.jobId },
    body: { mockupVersion: 1, finding: world.toFit.finding, reason: "A jig finds the place" },
  })),
  row(setAsides.takeBackSetAside, makers, (world) => ({
    params: { ...world.params, jobId: world.toFit.jobId, setAsideId: world.toFit.setAsideId },
  })),

  row(revisions.listRevisions, readers, job),
  row(revisions.issueRevision, makersOnVisible, (world) => ({ ...job(world), body: { mockupVersion: 1 } })),
  row(revisions.getRevision, readers, revision),
  row(revisions.getSheet, readers, revision),
  row(revisionDocuments.getRevisionDocument, staff, revision),
  row(revisions.getProof, readers, revision),
  row(revisions.getPicture, readers, revision),
  row(revisions.getCertificate, readers, (world) => ({
    params: { ...world.params, revisionId: world.certifiedRevisionId },
  })),
  row(revisions.withdrawRevision, makersOnVisible, (world) => ({
    params: { ...world.params, revisionId: world.toWithdrawRevisionId },
    body: { reason: "Wrong size." },
  })),
  row(revisions.askForRevision, approvers, (world) => ({
    params: { ...world.params, revisionId: world.toAskRevisionId },
    body: { summary: "Wider." },
  })),
  row(revisions.approveRevision, approvers, (world) => ({
    params: { ...world.params, revisionId: world.toApproveRevisionId },
    body: { typedName: "A. Person", acknowledgedIds: world.acknowledgedIds, pdfSha256: world.toApprovePdfSha256 },
  })),
  row(revisions.compareRevisions, readers, (world) => ({
    ...job(world),
    query: { before: world.revisionId, after: world.revisionId },
  })),

  row(notes.listNotes, readers, revision),
  row(notes.addNote, readers, (world) => ({
    ...revision(world),
    body: { text: "A little larger?", kind: "question", anchor: { on: "whole" } },
  })),
  row(notes.replyToNote, readers, (world) => ({
    params: { ...world.params, noteId: world.noteId },
    body: { text: "We can." },
  })),
  // Left by the approver, so only they put it right and settle it.
  row(notes.editNote, approvers, (world) => ({
    params: { ...world.params, noteId: world.noteId },
    body: { text: "Wider, please?", kind: "must change" },
  })),
  row(notes.editReply, approvers, (world) => ({
    params: { ...world.params, noteId: world.noteId, replyId: world.replyId },
    body: { text: "By a hand’s breadth." },
  })),
  row(notes.setNoteState, approvers, (world) => ({
    params: { ...world.params, noteId: world.noteId },
    body: { state: "settled" },
  })),

  row(portfolio.listPortfolioPieces, staff, inShop),
  row(portfolio.listShareLinks, staff, inShop),
  row(portfolio.makeShareLink, "y n y - - - - - o", (world) => ({
    ...inShop(world),
    body: { label: "For a client", jobIds: [world.showableJobId] },
  })),
  row(portfolio.revokeShareLink, "y n y - - - - - o", (world) => ({
    params: { ...world.params, linkId: world.spareShareLinkId },
  })),
  row(portfolio.openShareLink, anyone, (world) => ({ params: { token: world.liveShareToken } })),

  row(stock.listStock, staff, inShop),
  row(stock.addStockItem, makers, (world) => ({
    ...inShop(world),
    body: { entry: epoxyNamed(`Epoxy ${world.next()}`) },
  })),
  row(stock.changeStockItem, makers, (world) => ({
    params: { ...world.params, itemId: world.adhesiveId },
    body: { version: 1, entry: epoxyNamed(`Epoxy ${world.next()}`) },
  })),
  row(stock.countStockItem, makers, (world) => ({
    params: { ...world.params, itemId: world.screwId },
    body: { version: 1, quantity: 40 },
  })),
  row(stock.setStockState, makers, (world) => ({
    params: { ...world.params, itemId: world.adhesiveId },
    body: { state: "retired" },
  })),
  row(stock.addUsualStock, makers, inShop),
];

export const routeName = ({ method, path }: Endpoint): string => `${method} ${path}`;
