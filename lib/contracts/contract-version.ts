/**
 * Version of everything on the wire, HTTP and channel. A test holds a hash of all schemas beside it:
 * who changes a message raises the version and adds a line here.
 * 1: first.
 * 2: the list of cases says how many there are.
 * 3: team at planning, examination, advice and its confirmation, the physician's acceptance of a baseline, people.
 * 4: a plan may name its hospital.
 * 5: a pulse says who has the case open.
 * @source house rule: a whole number from 1
 */
export const contractVersion = 5;
