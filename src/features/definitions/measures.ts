/** One measure in plain words. `formula` reads as a sum on paper; `source` names where the method comes from. */
export type Measure = {
  /** The anchor that pages link to; never changes. */
  id: string;
  title: string;
  says: string;
  formula: string;
  /** What is left out, and what nothing gives. */
  edges: string;
  example?: string;
  source?: string;
};

export type MeasureGroup = { title: string; measures: readonly Measure[] };

export const MONEY_AND_HOURS: MeasureGroup = {
  title: 'Money and hours',
  measures: [
    {
      id: 'kept',
      title: 'Kept, of a rebuild and of a year',
      says: 'What is left of a rebuild once it has gone, and of a year after its overhead.',
      formula:
        'Kept of a rebuild = what it brought − purchase − every entry on it, whenever dated. Kept of a year = the sum over the rebuilds that left in it − overhead dated in it.',
      edges:
        'Own hours are no cost. Parted out, scrapped, own use and every other way out count with what they brought, 0 too. Without a purchase price there is no figure. Unsold ones stand beside it, never in it. A bill that comes after the sale counts in the year of the sale.',
      example: 'Brought 10,000, bought for 5,000, entries of 3,000: kept 2,000.',
    },
    {
      id: 'per-hour',
      title: 'By the hour, three ways',
      says: 'What an hour of work brings. Each view divides other hours, so each answers another question.',
      formula:
        'Own hours: sum kept ÷ sum own, unpaid hours. All hours: (sum kept + wages paid) ÷ (own + paid hours). After own wage: sum kept − own hours × the wanted pay per hour.',
      edges:
        'Only rebuilds whose hours are known stand above the line as well as below it. The mean of the single rates is never shown alone: a quick job with few hours rules it.',
      example: '3,000 over 100 hours and 1,000 over 25: 4,000 ÷ 125 = 32 an hour.',
    },
    {
      id: 'return',
      title: 'Return on cost, and by the year',
      says: 'What the money earned while it was in.',
      formula:
        'On cost = sum kept ÷ (sum purchase + sum entries). By the year = the rate at which all dated payments in and out come to nothing, on a year of 365 days.',
      edges:
        'One entry without a date leaves a rebuild out of the yearly rate. Where more than one rate fits, the one nearest to zero stands and it is said. Under about 60 days held it mostly measures speed.',
    },
    {
      id: 'tied-up',
      title: 'Money tied up, and how old it is',
      says: 'What lies in rebuilds that have not left on a day.',
      formula:
        'Sum over those bought by that day and not gone: purchase + entries dated up to that day + entries without a date.',
      edges: 'Age counts from the purchase. It is cost, not worth: what they will bring is not guessed.',
    },
    {
      id: 'old-sheet',
      title: 'What an old sheet would have said',
      says: 'A warning, never a figure of its own: what a list of one row for each sold car would claim.',
      formula:
        'Sold ones only: sale − purchase − the three largest kinds of bill of this shop, wages not among them. Counted so, a page leaves out every rebuild that left otherwise, and Time to sell those unsold too.',
      edges: 'Ranks stand from five rebuilds on. The whole figure beside it holds every bill and every way out.',
    },
  ],
};

export const PLAN_AND_OUTCOME: MeasureGroup = {
  title: 'Plan against outcome',
  measures: [
    {
      id: 'overrun',
      title: 'Overrun',
      says: 'How far the work ran over the estimate that was locked before it began.',
      formula: 'All together = (sum actual − sum estimate) ÷ sum estimate. Typical = the middle of the single ones.',
      edges:
        'Actual leaves out extras chosen on purpose and the purchase; what came free counts at its market value. An estimate of three or more categories that all came out to the cent was written over afterwards and is left out. What nobody had planned for is shown in money, never in a ratio of its category.',
      example: '100 became 300 and 1,000 became 900: all together +9%, typical +95%.',
    },
    {
      id: 'surprise',
      title: 'Surprise, known work costing more, chosen extra',
      says: 'Three reasons for spending more than planned, kept apart.',
      formula:
        'Surprise rate = rebuilds with at least one entry that nobody foresaw ÷ rebuilds where every entry says. Known work costing more = overrun − surprises.',
      edges:
        'A rebuild with an entry that does not say is left out and counted. A chosen extra is cost, but no overrun and no surprise.',
      source: 'Range: score interval of a share, Wilson 1927.',
    },
    {
      id: 'seen',
      title: 'Seen against unseen',
      says: 'What goes with a look before buying, with the range of the gap itself.',
      formula:
        'Gap = unseen − seen, of the figures shown. Its range for sums over sums: each rebuild’s distance from its group’s ratio, the two spreads put together. For shares: put together from the two score intervals.',
      edges:
        'A range that holds 0 could be luck. A gap goes with the look, it does not prove that the look made it. Fewer than five on a side: too few yet.',
      source: 'Ratio estimator, Cochran 1977, chapter 6; Welch 1947; Newcombe 1998, method 10.',
    },
    {
      id: 'trend',
      title: 'Trend',
      says: 'Is it getting better? A slope that no single rebuild can pull far.',
      formula:
        'For every two rebuilds: difference of the figure ÷ years between the days they left. The trend is the middle of all these slopes; its range is read from their order.',
      edges: 'A range that holds 0 could be luck. Over the latest 120 rebuilds. Fewer than five: too few yet.',
      source: 'Theil 1950; Sen 1968.',
    },
  ],
};

export const KINDS_AND_TIME: MeasureGroup = {
  title: 'Kinds of wreck, and time',
  measures: [
    {
      id: 'pulled',
      title: "Pulled toward the shop's average",
      says: 'A kind with few rebuilds says little by itself, so its mean is drawn toward the average of all kinds.',
      formula:
        'Pulled = w × its own mean + (1 − w) × the average of kinds; w = spread between kinds ÷ (that + spread within kinds ÷ its count). Range: ± 1.96 standard errors.',
      edges:
        'Kinds are ranked by the lower end of that range, from five rebuilds on. Where kinds differ no more than their rebuilds do, w is 0 and no difference is shown. Sum over sum stands beside it.',
      source: 'Random effects, DerSimonian and Laird 1986.',
    },
    {
      id: 'days-to-sell',
      title: 'Days to sell',
      says: 'The share still unsold by day since listing, with those that wait counted as waiting.',
      formula:
        'On each day with a sale: share before × (1 − sold that day ÷ still waiting that day). The middle is the first day with at most half unsold.',
      edges:
        'One that is unsold, or left otherwise, counts until its last day and then drops out without a sale. Days in an impossible order and sales without a listing day are left out and counted. Two classes are compared by what each day would have sold if they were alike.',
      source: 'Kaplan and Meier 1958; band: Greenwood, log-log; log-rank test, Mantel 1966.',
    },
    {
      id: 'stages',
      title: 'Days in each stage',
      says: 'Which part of the way takes the time: fetching, queue, shop, papers, listing, market.',
      formula: 'Days from one mark to the next; the middle, and the tenth and ninetieth of a hundred.',
      edges:
        'Each stage rests on the rebuilds that have both of its days in order; the others are counted. The market’s days are read from the curve, so that those waiting count.',
    },
    {
      id: 'contingency',
      title: 'Cushion, and how a rule is judged',
      says: 'How much to add to the next budget so that it holds as often as asked.',
      formula:
        'The past overruns in order, the one at place (n + 1) × how often, raised to a whole number. In two parts: known work in percent, surprises in money.',
      edges:
        'No more is promised than that place gives; too few rebuilds for it: too few yet. A rule is judged only on rebuilds that came after what it was set on.',
      source: 'Order statistics; split conformal prediction.',
    },
    {
      id: 'one-rebuild',
      title: 'One rebuild changes this by …',
      says: 'How much a figure leans on a single rebuild.',
      formula: 'The figure is worked out again without each rebuild in turn; the furthest of these stands.',
      edges: 'For a kind of wreck it is the rebuild furthest from the kind’s mean.',
    },
  ],
};

export const MEASURES: readonly MeasureGroup[] = [MONEY_AND_HOURS, PLAN_AND_OUTCOME, KINDS_AND_TIME];
