/** What a person has picked on the sheet or in the ledger: a net or a part of the flattened circuit. */
export type Selection = { readonly net: string } | { readonly part: string };
