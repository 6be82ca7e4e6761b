/** What a server action answers to a page: done, or one sentence for the person who asked. */
export type Deed = { readonly done: true } | { readonly done: false; readonly message: string };
