import type { z } from "zod";
import { loadStandardStock } from "#server/commands/load-standard-stock.ts";
import { addArtwork, artworkSchema, getArtworkPieces } from "#shared/contracts/artworks.ts";
import { changeJob, type Job, openJob } from "#shared/contracts/jobs.ts";
import { getMockup, saveMockup } from "#shared/contracts/mockups.ts";
import { getRevision, issueRevision, type Revision } from "#shared/contracts/revisions.ts";
import { boxOfPath } from "#shared/geometry/box.ts";
import { pathTransform, translateMatrix } from "#shared/geometry/transform.ts";
import type { MockupDocument } from "#shared/mockup/document.ts";
import type { TestApp } from "../app.ts";
import { buildLayer, buildSign } from "../build-sign.ts";
import { paintedPicture, pngOf } from "../pictures.ts";
import { signInAs, signInByMail } from "../sign-in.ts";
import type { Visitor } from "../visitor.ts";
import { type BuiltContact, buildClient, buildContact } from "./client.ts";
import { buildMember, type Member } from "./member.ts";

/** A shop at work: staff and a client's people, each signed in, and an empty job whose approver is the first contact. */
export type World = {
  readonly owner: Member;
  readonly params: { readonly shop: string };
  readonly visitors: Readonly<Record<"owner" | "maker" | "rep" | "approver" | "otherContact", Visitor>>;
  readonly approver: BuiltContact;
  readonly job: Job;
};

export async function buildWorld(app: TestApp, brief: { words?: string } = {}): Promise<World> {
  const owner = await buildMember();
  const { shop } = owner;
  await app.services.sequelize.transaction((transaction) =>
    loadStandardStock({ shopId: shop.id, now: new Date(), transaction }),
  );
  const client = await buildClient({ shop });
  const approver = await buildContact({ client });
  const otherContact = await buildContact({ client });
  const visitors = {
    owner: await signInAs(app, owner),
    maker: await signInAs(app, await buildMember({ shop, role: "maker" })),
    rep: await signInAs(app, await buildMember({ shop, role: "rep" })),
    approver: await signInByMail(app, approver),
    otherContact: await signInByMail(app, otherContact),
  };
  const params = { shop: shop.slug };
  const opened = await visitors.owner.get(openJob, {
    params,
    body: { clientId: client.id, title: "Lobby sign", dueOn: "2031-05-06" },
  });
  const job = await visitors.owner.get(changeJob, {
    params: { ...params, jobId: opened.id },
    body: {
      brief: {
        widthMm: 600,
        heightMm: 400,
        place: "inside",
        viewingDistanceMm: 4000,
        words: brief.words ?? "HERON & WEIR",
      },
      approverIds: [approver.contact.id],
    },
  });
  return { owner, params, visitors, approver, job };
}

/** Two squares and a disc, 200 by 100 mm. */
export const plainSvg = (fill = "#27314F") =>
  `<svg xmlns="http://www.w3.org/2000/svg" width="200mm" height="100mm" viewBox="0 0 200 100"><rect width="60" height="60" fill="${fill}"/><rect x="100" y="20" width="50" height="50" fill="${fill}"/><circle cx="180" cy="80" r="15" fill="#C8992F"/></svg>`;

export const formWith = (name: string, content: string | Uint8Array<ArrayBuffer>, type = "image/svg+xml"): FormData => {
  const form = new FormData();
  form.append("file", new Blob([content], { type }), name);
  return form;
};

export const artworksPath = ({ params, job }: World): string => `/api/shops/${params.shop}/jobs/${job.id}/artworks`;

/** Brings in a file as the page does and waits until it has become pieces. */
export async function buildArtwork(
  app: TestApp,
  world: World,
  svg = plainSvg(),
): Promise<z.output<typeof artworkSchema>> {
  return bringIn(app, world, formWith("logo.svg", svg));
}

/** The same with a picture: a blue square on transparent ground. */
export async function buildPicture(app: TestApp, world: World): Promise<z.output<typeof artworkSchema>> {
  const picture = paintedPicture(60, 40, (x, y) => (x > 10 && x < 40 && y > 5 && y < 35 ? "#27314F" : "#00000000"), 1);
  return bringIn(app, world, formWith("logo.png", pngOf(picture), "image/png"));
}

async function bringIn(app: TestApp, world: World, form: FormData): Promise<z.output<typeof artworkSchema>> {
  const { status, text } = await world.visitors.owner.send("POST", artworksPath(world), { body: form });
  if (status !== (addArtwork.status ?? 200)) throw new Error(`The artwork was refused: ${status} ${text}`);
  await app.runJobs();
  return artworkSchema.parse(JSON.parse(text));
}

/** A sign with every piece of an artwork bonded to the board, 150 mm in from its upper left corner. */
export async function signFromArtwork(world: World, artworkId: string, thickness = 3): Promise<MockupDocument> {
  const { pieces } = await world.visitors.owner.get(getArtworkPieces, { params: { ...world.params, artworkId } });
  return buildSign([
    buildLayer(
      "B",
      pieces.map(({ index, colour, path }) => {
        const { x, y, width, height } = boxOfPath(path) ?? { x: 0, y: 0, width: 0, height: 0 };
        const middle = { x: x + width / 2, y: y + height / 2 };
        return {
          id: `piece-${index}`,
          name: `Piece ${index}`,
          source: { kind: "artwork", artworkId, index, colour },
          path: pathTransform(path, translateMatrix(-middle.x, -middle.y)).map(({ start, segments }) => ({
            start,
            segments: [...segments],
          })),
          placement: { x: 150 + middle.x, y: 150 + middle.y, turn: 0, scale: 1, mirrored: false },
          reads: "",
        };
      }),
      { thickness },
    ),
  ]);
}

/** Saves a document as the newest draft and issues it; with `finished` the PDF is drawn too. */
export async function buildRevision(
  app: TestApp,
  world: World,
  { document, finished = true }: { document?: MockupDocument; finished?: boolean } = {},
): Promise<Revision> {
  const { owner } = world.visitors;
  const jobParams = { ...world.params, jobId: world.job.id };
  const drawn = document ?? (await signFromArtwork(world, (await buildArtwork(app, world)).id));
  const { version } = await owner.get(getMockup, { params: jobParams });
  const saved = await owner.get(saveMockup, { params: jobParams, body: { version, document: drawn } });
  const revision = await owner.get(issueRevision, { params: jobParams, body: { mockupVersion: saved.version } });
  if (!finished) return revision;
  await app.runJobs();
  return owner.get(getRevision, { params: { ...world.params, revisionId: revision.id } });
}
