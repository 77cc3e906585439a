/** Where the book is taken away as a file. Apart from its schemas: every page's menu links here, few need those. */
export const bookFiles = { json: "/api/book.json", csv: "/api/book.csv" } as const;
