import {
  type CreationOptional,
  DataTypes,
  type InferAttributes,
  type InferCreationAttributes,
  Model,
  type Sequelize,
} from "sequelize";
import type { ArtworkRefusal, ImportedArtwork } from "#shared/artwork/imported-artwork.ts";

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
      addedBy: DataTypes.UUID,
      addedAt: DataTypes.DATE,
      removedAt: DataTypes.DATE,
    },
    { sequelize, tableName: "artworks" },
  );
}
