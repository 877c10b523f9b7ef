interface Named {
  title: string | null;
  authors: string | null;
  year: number | null;
  venue?: string | null;
}

/** What a work is called: its title, or, for works known from references without one, what such references give. */
export function workName({ title, authors, year, venue }: Named): string {
  return title ?? ([authors, year, venue].filter((part) => part !== null && part !== undefined && part !== '').join(', ') || 'Untitled work');
}

/** Names of clusters are made from terms, which are lower case; on their own they begin with a capital. */
export const clusterName = (name: string): string => name.charAt(0).toLocaleUpperCase('en') + name.slice(1);
