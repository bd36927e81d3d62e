/** How a letter writes what differs from house to house. */
export interface Formats {
  imprint: string;
  /** A whole amount of minor units with its currency. */
  money: (minorUnits: number, currency: string) => string;
  /** The day of an instant (ISO 8601) in the imprint's zone. */
  day: (instant: string) => string;
}

export function formatsOf({ name, zone }: { name: string; zone: string }): Formats {
  const days = new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: zone });
  return {
    imprint: name,
    money: (amount, currency) => {
      const format = new Intl.NumberFormat('en-GB', { style: 'currency', currency });
      return format.format(amount / 10 ** (format.resolvedOptions().maximumFractionDigits ?? 2));
    },
    day: (instant) => days.format(new Date(instant)),
  };
}
