import { DataTypes, type InferAttributes, type InferCreationAttributes, Model, type Sequelize } from "sequelize";

export class ShareLinkPiece extends Model<InferAttributes<ShareLinkPiece>, InferCreationAttributes<ShareLinkPiece>> {
  declare shareLinkId: string;
  declare jobId: string;
  declare shopId: string;
  declare revisionId: string;
}

export function initShareLinkPiece(sequelize: Sequelize): void {
  ShareLinkPiece.init(
    {
      shareLinkId: { type: DataTypes.UUID, primaryKey: true },
      jobId: { type: DataTypes.UUID, primaryKey: true },
      shopId: DataTypes.UUID,
      revisionId: DataTypes.UUID,
    },
    { sequelize, tableName: "share_link_pieces" },
  );
}
