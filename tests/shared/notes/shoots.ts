/** Shoots invented for these tests, each with traps of its own. */

/** Rolling captions without a full stop: a correction across cues, a range, a spoken decimal, °F, an option that is not taken. */
const LINES = [
  "hello from the shed we're making",
  'a quince and thyme cordial today',
  'so take one kilo of quinces',
  'no make that one point two kilos',
  'washed and chopped skins on',
  'and a litre and a half of water',
  'into a big pan and simmer it for forty to fifty minutes',
  'with five or six sprigs of thyme',
  'then strain it through muslin for two hours',
  "and don't squeeze the bag or it goes cloudy",
  'now for every litre eight hundred grams of sugar',
  'and the juice of two lemons',
  'warm it to about a hundred and seventy fahrenheit until it dissolves',
  "you could add a star anise but I don't",
  'bottle it hot makes about two litres',
  'it keeps for six weeks in the fridge',
];
const clock = (seconds: number) =>
  `00:${String(Math.floor(seconds / 60)).padStart(2, '0')}:${String(seconds % 60).padStart(2, '0')}.000`;
export const QUINCE = `WEBVTT\n\n${LINES.map((line, index) => {
  const before = LINES[index - 1];
  return `${clock(index * 5)} --> ${clock(index * 5 + 5)} align:start\n${before ? `${before}\n` : ''}${line}\n`;
}).join('\n')}`;

/** Two stages, a split addition, an amount of the past, an alternative, something left out. */
export const PLUM_SOUR = `WEBVTT

00:01.000 --> 00:05.000
so this is the plum sour

00:05.000 --> 00:10.000
first the plum syrup that's equal parts

00:10.000 --> 00:15.000
two hundred grams of plums and two hundred grams of sugar

00:15.000 --> 00:20.000
and a hundred mil of water and then later another fifty mil of water

00:20.000 --> 00:25.000
to rinse the pan so simmer that for ten minutes

00:25.000 --> 00:30.000
cool it for half an hour and strain it

00:30.000 --> 00:34.000
so that makes two hundred and fifty mil

00:34.000 --> 00:39.000
for the drink sixty mil of bourbon or rye if you like

00:39.000 --> 00:44.000
twenty five mil of lemon juice I used to do thirty

00:44.000 --> 00:49.000
and twenty mil of the plum syrup

00:49.000 --> 00:54.000
a dash of orange bitters shake it hard for twelve seconds

00:54.000 --> 00:59.000
without the egg white I've stopped using egg white

00:59.000 --> 01:04.000
and strain it into a chilled coupe
`;

/** Punctuated captions: a bottle told again in centilitres, a peel counted by its fruit, milk, what others use. */
export const WHEY_PUNCH = `1
00:00:02,000 --> 00:00:06,000
Right then. Whey punch, enough for ten people.

2
00:00:06,500 --> 00:00:11,000
A bottle of aged rum, that's seventy centilitres.

3
00:00:11,500 --> 00:00:16,000
Two hundred and fifty millilitres of lemon juice,

4
00:00:16,200 --> 00:00:20,000
squeezed this morning, and the peel of four lemons.

5
00:00:20,500 --> 00:00:25,000
Half a pound of demerara sugar. Black tea, strong, half a litre.

6
00:00:25,500 --> 00:00:31,000
Stir the sugar, the peel and the rum together and leave it overnight.

7
00:00:32,000 --> 00:00:38,000
Next day: five hundred mils of whole milk. Heat it to sixty degrees, not boiling.

8
00:00:38,500 --> 00:00:44,000
Pour the punch into the milk, never the other way round. Wait an hour.

9
00:00:44,500 --> 00:00:50,000
Some people use oat milk. It doesn't curdle, so no oat milk.

10
00:00:50,500 --> 00:00:56,000
Strain it through a coffee filter, about three hours.

11
00:00:56,500 --> 00:01:01,000
A grating of nutmeg on top, or a pinch of mace.

12
00:01:01,500 --> 00:01:07,000
You get just over a litre. It lasts two to three months in the fridge.
`;

/** Typed rows with two takes: the later holds. */
export const SPRITZ = `0:00 Rhubarb spritz, two takes, second one is good
0:15 rhubarb syrup 30 ml
0:22 dry vermouth - 1 oz
0:31 lemon juice 15 ml
0:40 TAKE 2
0:45 rhubarb syrup 25 ml
0:52 dry vermouth 30 ml
1:01 lemon juice 15 ml
1:10 shake 8 sec w/ ice, strain into wine glass
1:22 top with sparkling wine, about 90 ml
1:35 pinch of salt, optional
1:44 orange slice
1:50 serves 1
2:00 drink at once
`;

/** A bulleted list and wrapped prose without times. */
export const COFFEE_BITTERS = `Coffee & orange bitters

- 200 ml overproof rum (63%)
- 40 g coffee beans, lightly crushed
- zest of 2 oranges
- 1 tsp gentian root
- 3 cardamom pods, cracked
- 1 1/2 tbsp demerara sugar
- 60 ml water

Put everything but the sugar and water in a jar and leave for 10-14 days somewhere dark, shaking
it once a day. Strain through muslin, then a coffee filter.
Dissolve the sugar in the water over a low heat, cool, and add to the strained bitters.
Makes about 220 ml. Keeps 2 years in the cupboard.
`;
