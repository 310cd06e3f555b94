import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { ArtworkRefusal, ImportedArtwork } from "#shared/artwork/imported-artwork.ts";
import type { TraceChoices } from "#shared/tracing/trace-choices.ts";
import type { TraceRecord } from "#shared/tracing/traced-picture.ts";

/** What lists show of an imported artwork, at the file's own size. */
export type ArtworkSummary = Pick<ImportedArtwork, "widthMm" | "heightMm" | "colours" | "warnings">;

export class Artwork extends Model<InferAttributes<Artwork>, InferCreationAttributes<Artwork>> {
  declare id: string;
  declare shopId: string;
  declare jobId: string;
  declare fileId: string;
  declare name: string;
  declare state: "importing" | "ready" | "refused";
  declare scale: CreationOptional<number>;
  declare summary: CreationOptional<ArtworkSummary | null>;
  declare pieces: CreationOptional<string | null>;
  declare refusal: CreationOptional<ArtworkRefusal | null>;
  declare trace: CreationOptional<TraceRecord | null>;
  declare traceAsked: CreationOptional<TraceChoices | null>;
  declare traceFailure: CreationOptional<ArtworkRefusal | null>;
  declare addedBy: string;
  declare addedAt: Date;
  declare removedAt: CreationOptional<Date | null>;
}

export function initArtwork(sequelize: Sequelize): void {
  Artwork.init(
    {
      id: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      jobId: DataTypes.UUID,
      fileId: DataTypes.UUID,
      name: DataTypes.TEXT,
      state: DataTypes.TEXT,
      scale: { type: DataTypes.DOUBLE, defaultValue: 1 },
      summary: DataTypes.JSONB,
      pieces: DataTypes.TEXT,
      refusal: DataTypes.JSONB,
      trace: DataTypes.JSONB,
      traceAsked: DataTypes.JSONB,
      traceFailure: DataTypes.JSONB,
      addedBy: DataTypes.UUID,
      addedAt: DataTypes.DATE,
      removedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "artworks" },
  );
}

/** Whether its file is a picture, whose outlines are traced. The artwork must have been read with its file. */
export const isPicture = ({ file }: Artwork): boolean =>
  file?.mediaType === "image/png" || file?.mediaType === "image/jpeg";
