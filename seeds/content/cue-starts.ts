const ARROW = /^(?:(?<h>\d+):)?(?<m>\d{2}):(?<s>\d{2})[.,](?<ms>\d{3}) --> /;
const SPOKEN = /^(?<m>\d+):(?<s>\d{2}) \S/;

/** The starts of the cues of WebVTT, SubRip or `m:ss` notes, in milliseconds and in the order of the file. */
export function cueStarts(notes: string): number[] {
  const pattern = notes.includes(' --> ') ? ARROW : SPOKEN;
  return notes.split('\n').flatMap((text) => {
    const found = pattern.exec(text)?.groups;
    if (!found) return [];
    const seconds = Number(found['h'] ?? 0) * 3600 + Number(found['m']) * 60 + Number(found['s']);
    return [seconds * 1000 + Number(found['ms'] ?? 0)];
  });
}
