import type { NonAttribute } from "sequelize";
import { Artwork } from "./artwork.ts";
import { Certificate } from "./certificate.ts";
import { Client } from "./client.ts";
import { Contact } from "./contact.ts";
import { Decision } from "./decision.ts";
import { Invitation } from "./invitation.ts";
import { Job } from "./job.ts";
import { JobApprover } from "./job-approver.ts";
import { Membership } from "./membership.ts";
import { Mockup } from "./mockup.ts";
import { NamedDraft } from "./named-draft.ts";
import { Note } from "./note.ts";
import { Person } from "./person.ts";
import { PriceBook } from "./price-book.ts";
import { Reply } from "./reply.ts";
import { Revision } from "./revision.ts";
import { ShareLink } from "./share-link.ts";
import { ShareLinkPiece } from "./share-link-piece.ts";
import { Shop } from "./shop.ts";
import { ShopLimits } from "./shop-limits.ts";
import { ShopSaws } from "./shop-saws.ts";
import { StoredFile } from "./stored-file.ts";
import { WallPhoto } from "./wall-photo.ts";

declare module "./membership.ts" {
  interface Membership {
    shop?: NonAttribute<Shop>;
    person?: NonAttribute<Person>;
  }
}
declare module "./invitation.ts" {
  interface Invitation {
    inviter?: NonAttribute<Person>;
  }
}
declare module "./client.ts" {
  interface Client {
    contacts?: NonAttribute<Contact[]>;
  }
}
declare module "./contact.ts" {
  interface Contact {
    client?: NonAttribute<Client>;
    person?: NonAttribute<Person>;
    shop?: NonAttribute<Shop>;
  }
}
declare module "./job.ts" {
  interface Job {
    client?: NonAttribute<Client>;
    approvers?: NonAttribute<JobApprover[]>;
    revisions?: NonAttribute<Revision[]>;
  }
}
declare module "./job-approver.ts" {
  interface JobApprover {
    contact?: NonAttribute<Contact>;
  }
}
declare module "./artwork.ts" {
  interface Artwork {
    file?: NonAttribute<StoredFile>;
    adder?: NonAttribute<Person>;
  }
}
declare module "./wall-photo.ts" {
  interface WallPhoto {
    file?: NonAttribute<StoredFile>;
    adder?: NonAttribute<Person>;
  }
}
declare module "./mockup.ts" {
  interface Mockup {
    saver?: NonAttribute<Person>;
  }
}
declare module "./named-draft.ts" {
  interface NamedDraft {
    keeper?: NonAttribute<Person>;
  }
}
declare module "./shop-limits.ts" {
  interface ShopLimits {
    saver?: NonAttribute<Person>;
  }
}
declare module "./shop-saws.ts" {
  interface ShopSaws {
    saver?: NonAttribute<Person>;
  }
}
declare module "./price-book.ts" {
  interface PriceBook {
    saver?: NonAttribute<Person>;
  }
}
declare module "./revision.ts" {
  interface Revision {
    job?: NonAttribute<Job>;
    pdf?: NonAttribute<StoredFile>;
    issuer?: NonAttribute<Person>;
    decision?: NonAttribute<Decision>;
  }
}
declare module "./decision.ts" {
  interface Decision {
    certificate?: NonAttribute<Certificate>;
  }
}
declare module "./certificate.ts" {
  interface Certificate {
    file?: NonAttribute<StoredFile>;
  }
}
declare module "./note.ts" {
  interface Note {
    replies?: NonAttribute<Reply[]>;
    revision?: NonAttribute<Revision>;
  }
}
declare module "./share-link.ts" {
  interface ShareLink {
    pieces?: NonAttribute<ShareLinkPiece[]>;
    maker?: NonAttribute<Person>;
  }
}
declare module "./share-link-piece.ts" {
  interface ShareLinkPiece {
    job?: NonAttribute<Job>;
    revision?: NonAttribute<Revision>;
  }
}

/** Who refers to whom, in one place so that no model imports another. */
export function associate(): void {
  Membership.belongsTo(Shop, { as: "shop", foreignKey: "shopId" });
  Membership.belongsTo(Person, { as: "person", foreignKey: "personId" });
  Invitation.belongsTo(Person, { as: "inviter", foreignKey: "invitedBy" });
  Client.hasMany(Contact, { as: "contacts", foreignKey: "clientId" });
  Contact.belongsTo(Client, { as: "client", foreignKey: "clientId" });
  Contact.belongsTo(Person, { as: "person", foreignKey: "personId" });
  Contact.belongsTo(Shop, { as: "shop", foreignKey: "shopId" });
  Job.belongsTo(Client, { as: "client", foreignKey: "clientId" });
  Job.hasMany(JobApprover, { as: "approvers", foreignKey: "jobId" });
  Job.hasMany(Revision, { as: "revisions", foreignKey: "jobId" });
  JobApprover.belongsTo(Contact, { as: "contact", foreignKey: "contactId" });
  Artwork.belongsTo(Job, { as: "job", foreignKey: "jobId" });
  Artwork.belongsTo(StoredFile, { as: "file", foreignKey: "fileId" });
  Artwork.belongsTo(Person, { as: "adder", foreignKey: "addedBy" });
  WallPhoto.belongsTo(Job, { as: "job", foreignKey: "jobId" });
  WallPhoto.belongsTo(StoredFile, { as: "file", foreignKey: "fileId" });
  WallPhoto.belongsTo(Person, { as: "adder", foreignKey: "addedBy" });
  Mockup.belongsTo(Person, { as: "saver", foreignKey: "savedBy" });
  NamedDraft.belongsTo(Person, { as: "keeper", foreignKey: "keptBy" });
  ShopLimits.belongsTo(Person, { as: "saver", foreignKey: "savedBy" });
  ShopSaws.belongsTo(Person, { as: "saver", foreignKey: "savedBy" });
  PriceBook.belongsTo(Person, { as: "saver", foreignKey: "savedBy" });
  Revision.belongsTo(Job, { as: "job", foreignKey: "jobId" });
  Revision.belongsTo(StoredFile, { as: "pdf", foreignKey: "pdfFileId" });
  Revision.belongsTo(Person, { as: "issuer", foreignKey: "issuedBy" });
  Revision.hasOne(Decision, { as: "decision", foreignKey: "revisionId" });
  Decision.hasOne(Certificate, { as: "certificate", foreignKey: "decisionId" });
  Certificate.belongsTo(StoredFile, { as: "file", foreignKey: "fileId" });
  Note.hasMany(Reply, { as: "replies", foreignKey: "noteId" });
  Note.belongsTo(Revision, { as: "revision", foreignKey: "revisionId" });
  ShareLink.hasMany(ShareLinkPiece, { as: "pieces", foreignKey: "shareLinkId" });
  ShareLink.belongsTo(Person, { as: "maker", foreignKey: "createdBy" });
  ShareLinkPiece.belongsTo(Job, { as: "job", foreignKey: "jobId" });
  ShareLinkPiece.belongsTo(Revision, { as: "revision", foreignKey: "revisionId" });
}
