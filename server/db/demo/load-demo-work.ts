import { addNote } from "../../commands/add-note.ts";
import { askForRevision } from "../../commands/ask-for-revision.ts";
import { replyToNote } from "../../commands/reply-to-note.ts";
import type { Context } from "../../http/context.ts";
import { Shop } from "../../models/shop.ts";
import { contextsOf, type DemoContexts } from "./demo-actors.ts";
import { oarsSvg, orrerySvg, rackSvg, wheatSvg } from "./demo-artwork.ts";
import { loadDemoPrices } from "./demo-prices.ts";
import { oarsSign, orrerySign, rackSign } from "./demo-signs.ts";
import { demoApproval, demoArtwork, demoIssue, demoJob } from "./demo-steps.ts";
import { loadDemoStock } from "./demo-stock.ts";
import type { DemoIds } from "./load-demo-people.ts";

/** Fills the demo shop: stock, and a job in each state that a visitor wants to see. */
export async function loadDemoWork(owner: Context, ids: DemoIds): Promise<void> {
  const { transaction, now } = owner;
  const contexts = contextsOf(owner, ids);
  await loadDemoStock({ shopId: ids.shopId, now, transaction });
  await loadDemoPrices(contexts.asOwner(20), ids.shopId);
  await loadRackPlates(contexts, ids);
  await loadBoathouse(contexts, ids);
  await loadBakehouse(contexts, ids);
  await loadOrrery(contexts, ids);
  await Shop.update({ nextJobNumber: 143 }, { where: { id: ids.shopId }, transaction });
}

const club = "Saltgrass Rowing Club";
const shop = "Orrery Books";

/** Approved, with consent: free to build and to be shown. */
async function loadRackPlates({ asMaker, asContact, dueIn }: DemoContexts, ids: DemoIds): Promise<void> {
  const jobId = await demoJob(asMaker(16), ids, {
    number: 135,
    client: club,
    title: "Boat rack plates",
    dueOn: dueIn(15),
    brief: {
      widthMm: 240,
      heightMm: 130,
      place: "inside",
      viewingDistanceMm: 4000,
      quantity: 6,
      words: "RACK 4",
      about: "Plates for the boat racks, one a bay.",
    },
  });
  const artwork = await demoArtwork(asMaker(15), { jobId, name: "rack-4.svg", svg: rackSvg });
  const revisionId = await demoIssue(asMaker(14), {
    jobId,
    version: 1,
    document: rackSign(artwork),
    message: "Six of these, numbers differ.",
  });
  await demoApproval(asContact(club, 11), { revisionId, typedName: "Aurel Brandt" });
}

/** A was sent back, B is with the client. */
async function loadBoathouse({ asMaker, asContact, dueIn }: DemoContexts, ids: DemoIds): Promise<void> {
  const jobId = await demoJob(asMaker(12), ids, {
    number: 137,
    client: club,
    title: "Boathouse sign",
    dueOn: dueIn(9),
    brief: {
      widthMm: 560,
      heightMm: 360,
      place: "inside",
      viewingDistanceMm: 8000,
      words: "SALTGRASS",
      wall: "boarded, painted white",
      about: "Over the door of the boat hall.",
    },
  });
  const artwork = await demoArtwork(asMaker(11), { jobId, name: "crossed-oars.svg", svg: oarsSvg });
  const first = await demoIssue(asMaker(10), {
    jobId,
    version: 1,
    document: oarsSign(artwork, { width: 500 }),
    message: "",
  });
  await askForRevision(asContact(club, 8), {
    revisionId: first,
    summary: "The committee would like more wood around the oars.",
  });
  await demoIssue(asMaker(3), {
    jobId,
    version: 2,
    document: oarsSign(artwork, { width: 560 }),
    message: "The board is 60 mm wider.",
  });
}

/** The brief is complete and the artwork is in; nothing is drawn yet. */
async function loadBakehouse({ asMaker, dueIn }: DemoContexts, ids: DemoIds): Promise<void> {
  const jobId = await demoJob(asMaker(1), ids, {
    number: 139,
    client: "Marlow & Pike Bakehouse",
    title: "Door sign, wheat disc",
    dueOn: dueIn(12),
    brief: {
      widthMm: 420,
      heightMm: 420,
      place: "inside",
      viewingDistanceMm: 5000,
      words: "MARLOW & PIKE",
      brandColours: "Holly and Marigold",
      about: "A bakehouse. Wheat ears let into a dark disc.",
    },
  });
  await demoArtwork(asMaker(1), { jobId, name: "wheat.svg", svg: wheatSvg });
}

/** A was asked to change, B is out with a note that waits on the shop. */
async function loadOrrery({ asMaker, asContact, dueIn }: DemoContexts, ids: DemoIds): Promise<void> {
  const jobId = await demoJob(asMaker(9), ids, {
    number: 142,
    client: shop,
    title: "Lobby sign, rings and planets",
    dueOn: dueIn(20),
    brief: {
      widthMm: 600,
      heightMm: 400,
      place: "inside",
      viewingDistanceMm: 5000,
      wall: "lime plaster",
      lighting: "two lamps from the upper left",
      words: "ORRERY BOOKS",
      brandColours: "night blue, brass",
      about: "A bookshop under the old observatory.",
    },
  });
  const artwork = await demoArtwork(asMaker(8), { jobId, name: "orrery.svg", svg: orrerySvg });
  const first = await demoIssue(asMaker(6), {
    jobId,
    version: 1,
    document: orrerySign(artwork, { ringThickness: 3 }),
    message: "The disc stands 19 mm off the board.",
  });
  const reader = asContact(shop, 5);
  const ring = await addNote(reader, {
    revisionId: first,
    kind: "must change",
    text: "Can the rings be a little thicker? They get lost from the door.",
    anchor: { on: "spot", x: 392, y: 150, layerKey: "C", pieceId: null },
    shopOnly: false,
  });
  await askForRevision(reader, { revisionId: first, summary: "" });
  const second = await demoIssue(asMaker(2), {
    jobId,
    version: 2,
    document: orrerySign(artwork, { ringThickness: 4.5 }),
    message: "The rings are cut from thicker sheet now.",
  });
  await replyToNote(asMaker(2), { noteId: ring.id, text: "Now 4.5 mm thick, it was 3. See it in Compare." });
  await addNote(asContact(shop, 1), {
    revisionId: second,
    kind: "question",
    text: "Will the caps be brushed or polished?",
    anchor: { on: "spot", x: 376, y: 74, layerKey: "B", pieceId: null },
    shopOnly: false,
  });
}
