import ICAL from 'ical.js';

/** A moment as the calendar file writes it: clock time in its own zone, not converted. */
export interface CalendarTime {
  year: number;
  /** 1 to 12. */
  month: number;
  day: number;
  hour: number;
  minute: number;
  isWholeDay: boolean;
  /** TZID as written, "UTC", or "floating" when the file names none. */
  zone: string;
}

export interface CalendarEntry {
  summary: string;
  start: CalendarTime | null;
  end: CalendarTime | null;
  place: string;
  sequence: number;
  uid: string;
  status: string;
  organizer: string;
  attendees: string[];
}

export type CalendarReading =
  { isReadable: true; method: string | null; entries: CalendarEntry[] } | { isReadable: false; problem: string };

/** Reads a calendar file (RFC 5545); what is no calendar gives the reason instead of throwing. */
export function readCalendar(text: string): CalendarReading {
  try {
    const root = new ICAL.Component(ICAL.parse(text) as unknown[] as ConstructorParameters<typeof ICAL.Component>[0]);
    const method = root.getFirstPropertyValue('method');
    return {
      isReadable: true,
      method: typeof method === 'string' ? method.toUpperCase() : null,
      entries: root.getAllSubcomponents('vevent').map(toEntry),
    };
  } catch (error) {
    return { isReadable: false, problem: error instanceof Error ? error.message : String(error) };
  }
}

type Component = InstanceType<typeof ICAL.Component>;

function toEntry(component: Component): CalendarEntry {
  const event = new ICAL.Event(component);
  return {
    summary: event.summary ?? '',
    start: toTime(event.startDate, component, 'dtstart'),
    // Worked out from the duration where the file gives one instead of an end.
    end: event.startDate
      ? toTime(event.endDate, component, component.hasProperty('dtend') ? 'dtend' : 'dtstart')
      : null,
    place: event.location ?? '',
    sequence: event.sequence ?? 0,
    uid: event.uid ?? '',
    status: textOf(component, 'status'),
    organizer: personOf(textOf(component, 'organizer')),
    attendees: event.attendees.map((property) => personOf(String(property.getFirstValue() ?? ''))),
  };
}

function toTime(time: InstanceType<typeof ICAL.Time> | null, component: Component, name: string): CalendarTime | null {
  if (!time) return null;
  const zoneParameter = component.getFirstProperty(name)?.getParameter('tzid');
  const zone = typeof zoneParameter === 'string' ? zoneParameter : (time.zone?.tzid ?? 'floating');
  const { year, month, day, hour, minute, isDate } = time;
  return { year, month, day, hour, minute, isWholeDay: isDate, zone };
}

function textOf(component: Component, name: string): string {
  const value = component.getFirstPropertyValue(name);
  return value === null ? '' : String(value);
}

function personOf(address: string): string {
  return address.replace(/^mailto:/i, '');
}
