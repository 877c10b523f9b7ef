/** People who sign in to the demonstration. Only the author also stands in the bibliography. */
export const demonstrationPeople = [
  { role: 'administrator', name: 'Maren Oddny', email: 'admin@tarnholm.example' },
  { role: 'librarian', name: 'Tobias Fennick', email: 'librarian@tarnholm.example' },
  { role: 'evaluator', name: 'Priya Ruskeala', email: 'evaluator@tarnholm.example' },
  { role: 'author', name: 'Ilse Marwick', email: 'author@tarnholm.example' },
  { role: 'reader', name: 'Osric Vantongeren', email: 'reader@tarnholm.example' },
] as const;
