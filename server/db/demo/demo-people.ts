/** Everybody and everything here is invented; the addresses end in .example, which nobody can own (RFC 2606). */
export const demoShop = {
  slug: "copperlark-signs",
  name: "Copperlark Signs",
  unit: "mm",
  jobPrefix: "CL",
  paper: "A3",
} as const;

export const demoStaffNames = { owner: "Hazel Thornbury", maker: "Tobin Ashgrove", rep: "Marguerite Lowen" } as const;

export const demoClients = [
  {
    name: "Orrery Books",
    remarks: "A bookshop under the old observatory. Planets on rings, raised over slats.",
    contacts: [
      { name: "Ines Calloway", email: "client@orrery.example" },
      { name: "Fennimore Pike", email: "shelves@orrery.example" },
    ],
  },
  {
    name: "Marlow & Pike Bakehouse",
    remarks: "Wheat ears let into a dark disc. Delivery before seven in the morning only.",
    contacts: [{ name: "Rosalind Marlow", email: "oven@marlowpike.example" }],
  },
  {
    name: "Saltgrass Rowing Club",
    remarks: "Crossed oars for the boathouse; the committee decides.",
    contacts: [
      { name: "Aurel Brandt", email: "captain@saltgrass.example" },
      { name: "Wilhelmina Oake", email: "treasurer@saltgrass.example" },
    ],
  },
] as const;
