import ICAL from 'ical.js';
import type { DayAnswer, LadderAnswer } from '../../text/eveningAnswers';
import { eventTitle, rungSettings, turningTitle } from '../../text/eveningText';

/** An entry of the calendar: an instant with words. */
interface Entry {
  readonly key: string;
  readonly at: string;
  readonly title: string;
  readonly words?: string;
}

function entriesOf(day: DayAnswer, ladder: LadderAnswer | null): Entry[] {
  const suns = day.events.flatMap(({ name, at }): Entry[] =>
    at === null ? [] : [{ key: name, at, title: eventTitle(name) }],
  );
  const turns = (ladder?.turningPoints ?? []).map((turn): Entry => {
    const rung = ladder?.rungs.find(({ at, until }) => at <= turn.at && turn.at < until);
    return {
      key: turn.code + (turn.isLeft ? '-left' : ''),
      at: turn.at,
      title: turningTitle(turn),
      words: rung && rungSettings(rung).join(', '),
    };
  });
  return [...suns, ...turns].sort((a, b) => Date.parse(a.at) - Date.parse(b.at));
}

const timeOf = (at: string) => ICAL.Time.fromJSDate(new Date(at), true);

/**
 * The evening as a calendar file by RFC 5545: twilights and turning points as instants in UTC, which every calendar
 * shows in its reader's own zone. Entries keep their identity, so that a file made anew replaces them.
 */
export function calendarFile(
  place: { readonly latitude: number; readonly longitude: number },
  day: DayAnswer,
  ladder: LadderAnswer | null,
  madeAt: Date,
): string {
  const calendar = new ICAL.Component('vcalendar');
  calendar.updatePropertyWithValue('version', '2.0');
  calendar.updatePropertyWithValue('prodid', '-//Evenfall//Evening//EN');
  for (const { key, at, title, words } of entriesOf(day, ladder)) {
    const event = new ICAL.Component('vevent');
    event.updatePropertyWithValue(
      'uid',
      `${day.date}-${place.latitude}-${place.longitude}-${key}-${at}@evenfall`,
    );
    event.updatePropertyWithValue('dtstamp', ICAL.Time.fromJSDate(madeAt, true));
    event.updatePropertyWithValue('dtstart', timeOf(at));
    event.updatePropertyWithValue('summary', title);
    if (words) event.updatePropertyWithValue('description', words);
    event.updatePropertyWithValue('geo', [place.latitude, place.longitude]);
    event.updatePropertyWithValue('transp', 'TRANSPARENT');
    calendar.addSubcomponent(event);
  }
  return `${calendar.toString()}\r\n`;
}
