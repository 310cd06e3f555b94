/** What someone may do with their own account, by how they signed in. */
export const accountPolicy = {
  /** Whoever only reads the mail must not rename someone who also signs in with a password. */
  rename: ({ began, hasPassword }: { began: "password" | "link"; hasPassword: boolean }): boolean =>
    began === "password" || !hasPassword,
};
