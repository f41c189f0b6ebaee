/** Something that the person at the keyboard can put right: shown as its message alone, without a stack. */
export class PeopleError extends Error {
  readonly isForPeople = true;
}
