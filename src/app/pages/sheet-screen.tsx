import { useMemo, useRef, useState } from "react";
import { type AddressOf, addresses } from "#shared/contracts/addresses.ts";
import type { getCertificate, getProof, Revision, SheetView } from "#shared/contracts/revisions.ts";
import { waitsOnShop } from "#shared/lifecycle/note-states.ts";
import { useNotes } from "@/features/notes/api/queries.ts";
import { Balloons } from "@/features/notes/components/balloons.tsx";
import { NoteComposer } from "@/features/notes/components/note-composer.tsx";
import { NotesPanel } from "@/features/notes/components/notes-panel.tsx";
import { useNoteDesk } from "@/features/notes/components/use-note-desk.ts";
import { ElevationView } from "@/features/sheet/components/elevation-view.tsx";
import { SectionView } from "@/features/sheet/components/section-view.tsx";
import { SheetDesk, type SheetParts } from "@/features/sheet/components/sheet-desk.tsx";
import { SheetFigures } from "@/features/sheet/components/sheet-figures.tsx";
import { SheetInHand, type SheetTab } from "@/features/sheet/components/sheet-in-hand.tsx";
import { SheetTools } from "@/features/sheet/components/sheet-tools.tsx";
import { StandingBanner } from "@/features/sheet/components/standing-banner.tsx";
import { TitleBlock } from "@/features/sheet/components/title-block.tsx";
import { ViewHeading } from "@/features/sheet/components/view-heading.tsx";
import { hasDimensions } from "@/features/sheet/model/dimensions.ts";
import { addressOf } from "@/lib/api-client.ts";
import type { DrawingView } from "@/lib/drawing-view.ts";
import { ScheduleList, ScheduleTable } from "@/lib/schedule.tsx";
import { useMedia } from "@/lib/use-media.ts";
import { paths } from "../paths.ts";
import { SheetDecisions } from "./sheet-decisions.tsx";

const proofAt: AddressOf<typeof getProof> = addresses.getProof;
const certificateAt: AddressOf<typeof getCertificate> = addresses.getCertificate;

type SheetScreenProps = { readonly shop: string; readonly revision: Revision; readonly sheet: SheetView };

/** The sheet with its notes and decisions, on a desk or in the hand. */
export function SheetScreen({ shop, revision, sheet }: SheetScreenProps) {
  const { job, reader } = sheet;
  const isDesk = useMedia("(min-width: 72rem)");
  const [view, setView] = useState<DrawingView | null>(null);
  const [showDimensions, setShowDimensions] = useState(true);
  const [tab, setTab] = useState<SheetTab>("front");
  const top = useRef<HTMLDivElement>(null);
  const banner = useRef<HTMLDivElement>(null);
  const desk = useNoteDesk(revision.id);
  const { notes, isWhole, isLoading, error, refetch } = useNotes(shop, revision.id);
  const pieceNames = useMemo(() => new Map(sheet.pieces.map(({ id, name }) => [id, name])), [sheet.pieces]);
  const proofAddress = addressOf(proofAt, { params: { shop, revisionId: revision.id } });
  const isClient = reader.side === "client";

  function showDrawing() {
    setTab("front");
    if (!isDesk) top.current?.scrollIntoView({ block: "start" });
  }

  function handleBegin() {
    desk.begin();
    showDrawing();
  }

  function handleSelect(noteId: string | null) {
    desk.select(noteId);
    if (noteId !== null && tab !== "front") setTab("front");
  }

  const draftSpot = desk.draft?.anchor?.on === "spot" ? desk.draft.anchor : null;
  const composer = desk.draft !== null && revision.can.note && (
    <NoteComposer
      shop={shop}
      revisionId={revision.id}
      draft={desk.draft}
      onDraft={desk.change}
      pieces={sheet.pieces}
      maySayShopOnly={!isClient}
      isPlacing={desk.isPlacing}
      onPlace={() => {
        desk.startPlacing();
        showDrawing();
      }}
      onAdded={desk.land}
      onLeave={desk.leave}
    />
  );
  const parts: SheetParts = {
    elevation: (
      <ElevationView
        sheet={sheet}
        view={view}
        onView={setView}
        showDimensions={showDimensions}
        showZones={isDesk}
        isPlacing={desk.isPlacing}
        onTouch={desk.place}
        onLeavePlacing={desk.stopPlacing}
        balloons={(origin, shown, room, fit) => (
          <Balloons
            notes={notes}
            origin={origin}
            view={shown}
            fit={fit}
            room={room}
            selectedId={desk.selectedId}
            onSelect={handleSelect}
            onView={setView}
            draft={draftSpot}
            isPlacing={desk.isPlacing}
          />
        )}
      />
    ),
    section: <SectionView sheet={sheet} isBeside={isDesk} />,
    schedule: isDesk ? <ScheduleTable rows={sheet.schedule} /> : <ScheduleList rows={sheet.schedule} unit={job.unit} />,
    figures: <SheetFigures sheet={sheet} />,
    notes: (
      <NotesPanel
        shop={shop}
        revisionId={revision.id}
        letter={revision.letter}
        notes={notes}
        isLoading={isLoading}
        isWhole={isWhole}
        error={error}
        onRetry={() => void refetch()}
        canNote={revision.can.note}
        onAdd={handleBegin}
        pieceNames={pieceNames}
        selectedId={desk.selectedId}
        onSelect={handleSelect}
        onTakeUpAgain={desk.takeUpAgain}
        composer={composer || null}
      />
    ),
    decisions: (
      <SheetDecisions
        shop={shop}
        revision={revision}
        sheet={sheet}
        notes={notes}
        proofAddress={proofAddress}
        isDesk={isDesk}
        onDecided={() => banner.current?.focus()}
      />
    ),
    titleBlock: <TitleBlock sheet={sheet} revision={revision} toAnswer={notes.filter(waitsOnShop).length} />,
  };
  const tools = (
    <SheetTools
      revision={revision}
      others={sheet.others}
      proofAddress={proofAddress}
      pathOfCompare={(before, after) => paths.compare(shop, job.id, before, after)}
      jobPath={paths.job(shop, job.id)}
      mockupPath={isClient ? null : paths.mockup(shop, job.id)}
      dimensions={
        hasDimensions(sheet.elevation) && (isDesk || tab === "front")
          ? { shown: showDimensions, onToggle: () => setShowDimensions((shown) => !shown) }
          : null
      }
    />
  );
  const standing = (
    <StandingBanner
      revision={revision}
      shopName={job.shopName}
      pathOfSheet={(id) => paths.sheet(shop, id)}
      certificateAddress={addressOf(certificateAt, { params: { shop, revisionId: revision.id } })}
      bannerRef={banner}
    />
  );

  return (
    <div ref={top} className="lg:px-6">
      <div className="flex flex-wrap items-baseline justify-between gap-x-8 px-4 pt-3 pb-2 lg:px-0">
        <div className="min-w-0">
          <h1 className="font-serif text-xl font-bold lg:text-lg">
            {job.title}, revision {revision.letter}
          </h1>
          <p className="text-sm text-graphite">
            {job.shopName} for {job.client}. You are reading as {reader.name}
            {isClient ? (reader.approver ? ", who decides" : `, of ${job.client}`) : `, of ${job.shopName}`}.
          </p>
          {revision.message && (
            <p className="mt-1 max-w-3xl text-sm whitespace-pre-line text-ink">
              {revision.issuedBy}: “{revision.message}”
            </p>
          )}
        </div>
        {isDesk && <div className="flex flex-wrap gap-x-5">{tools}</div>}
      </div>
      <div className="px-4 pb-2 lg:px-0">{standing}</div>
      {isDesk ? (
        <SheetDesk
          parts={parts}
          elevationHeading={
            <ViewHeading trade="Front elevation" plain={isClient && "from the front"} after={measuresIn(job.unit)} />
          }
          sectionHeading={<ViewHeading trade="Section" plain={isClient && "from the side"} />}
          scheduleHeading={<ViewHeading trade="Schedule" plain={isClient && "what it is made of"} />}
          viewsMm={{ elevation: sheet.elevation.widthMm, section: sheet.section.widthMm }}
        />
      ) : (
        <SheetInHand
          parts={parts}
          tools={tools}
          tab={tab}
          onTab={setTab}
          shape={sheet.elevation.heightMm / sheet.elevation.widthMm}
        />
      )}
      <p role="status" className="sr-only">
        {desk.said}
      </p>
    </div>
  );
}

const measuresIn = (unit: "mm" | "in"): string => (unit === "mm" ? "measures in mm" : "measures in inches");
