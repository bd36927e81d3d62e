import * as captions from 'media-captions';

interface ParsedCaptions {
  /** Times in seconds. */
  cues: { startTime: number; endTime: number; text: string }[];
  errors: { message: string; line: number }[];
}

/**
 * The caption parser of media-captions (WebVTT by the W3C's rules, SubRip). Its published types re-export without file
 * endings, which Node's resolution does not follow; this is the part of them that is used here.
 */
export const parseCaptions = (
  captions as unknown as {
    parseText: (text: string, options: { type: 'vtt' | 'srt'; errors: boolean }) => Promise<ParsedCaptions>;
  }
).parseText;
