import { TODAY } from './invent.ts';

/**
 * The five questions as SQL over raw lines. What SQL cannot say in reason (annual returns, the log-rank test) is left
 * out here and not in the product, so the comparison leans toward DuckDB.
 */
const COST = `cost AS (SELECT rebuild, sum(cents) AS a, sum(cents) FILTER (surprise) AS u, bool_or(surprise AND cents > 0) AS s
  FROM lines WHERE rebuild IS NOT NULL GROUP BY rebuild)`;
const DONE = `${COST}, done AS (SELECT r.*, coalesce(a, 0) AS a, coalesce(u, 0) AS u, coalesce(s, false) AS s,
  sale - purchase - coalesce(a, 0) AS profit FROM rebuilds r LEFT JOIN cost ON rebuild = id WHERE sold <= DATE '${TODAY}')`;
const PLANNED = `${DONE}, plan AS (SELECT rebuild, sum(cents) AS e FROM plans GROUP BY rebuild),
  k AS (SELECT done.*, e, a - e AS over, (a - e) / e AS o FROM done JOIN plan ON rebuild = id WHERE e > 0)`;
const YEAR = TODAY.slice(0, 4);
const SPREAD = `count(*), sum(over) / sum(e), median(o), avg(o), quantile_cont(o, [0.1, 0.25, 0.75, 0.9])`;
const FIT = `count(*), sum(profit) / sum(own), avg(profit / own), stddev_samp(profit / own), sum(profit), sum(own)`;
const FIT_ON_COST = `count(*), sum(profit) / sum(purchase + a), avg(profit / (purchase + a)), stddev_samp(profit / (purchase + a))`;
const BY_CATEGORY = `by_category AS (SELECT rebuild, category, sum(cents) AS b, sum(cents) FILTER (surprise) AS u
  FROM lines WHERE rebuild IS NOT NULL GROUP BY ALL)`;

export const DUCK_QUESTIONS = {
  year: [
    `WITH ${DONE} SELECT year(sold), count(*), sum(profit) FROM done GROUP BY 1`,
    `SELECT year(day), sum(cents) FROM lines WHERE rebuild IS NULL GROUP BY 1`,
    `WITH ${DONE} SELECT sum(profit), sum(own), sum(sale), sum(purchase), median(profit / own), median(sold - bought)
     FROM done WHERE year(sold) = ${YEAR}`,
    `WITH ${DONE} SELECT category, sum(cents) FROM lines JOIN done ON rebuild = id WHERE year(sold) = ${YEAR} GROUP BY 1`,
    `WITH ${DONE}, steps AS (SELECT sold AS day, profit AS cents FROM done UNION ALL
       SELECT day, -cents FROM lines WHERE rebuild IS NULL)
     SELECT day, sum(cents) OVER (PARTITION BY year(day) ORDER BY day) FROM steps WHERE year(day) >= ${YEAR} - 1`,
    `WITH ${PLANNED} SELECT id, bought, sold, purchase, a, profit, own, e, u FROM k WHERE year(sold) = ${YEAR} ORDER BY sold DESC LIMIT 300`,
    `SELECT year(sold), count(*), sum(cents) FROM lines JOIN rebuilds ON rebuild = id WHERE day > sold GROUP BY 1`,
    `WITH days AS (SELECT least(make_date(y::INTEGER, 12, 31), DATE '${TODAY}') AS d FROM range(2016, ${YEAR} + 1) t(y)),
       held AS (SELECT d, id, purchase FROM days JOIN rebuilds ON bought <= d AND (sold IS NULL OR sold > d))
     SELECT d, count(DISTINCT id), sum(cents) FROM held JOIN lines ON rebuild = id AND day <= d GROUP BY 1`,
  ],
  'what-pays': [
    ...['class, damage', 'class', 'damage'].flatMap((by) => [
      `WITH ${DONE} SELECT ${by}, ${FIT} FROM done WHERE own > 0 GROUP BY ALL`,
      `WITH ${DONE} SELECT ${by}, ${FIT_ON_COST} FROM done GROUP BY ALL`,
    ]),
    `WITH ${DONE} SELECT count(*), sum(profit), sum(sale), median(profit / (purchase + a)), sum(own), sum(own + paid) FROM done`,
  ],
  overruns: [
    `WITH ${PLANNED} SELECT ${SPREAD} FROM k`,
    `WITH ${PLANNED} SELECT id, over, o FROM k`,
    `WITH ${BY_CATEGORY}, each AS (SELECT p.category, coalesce(b, 0) - p.cents AS over, p.cents AS e,
       (coalesce(b, 0) - p.cents) / p.cents AS o, u FROM plans p JOIN rebuilds r ON r.id = p.rebuild AND sold IS NOT NULL
       LEFT JOIN by_category c ON c.rebuild = p.rebuild AND c.category = p.category)
     SELECT category, ${SPREAD}, sum(u), histogram(floor(o * 10)) FROM each GROUP BY category`,
    `WITH ${BY_CATEGORY} SELECT c.category, count(*), sum(b) FROM by_category c JOIN rebuilds r ON r.id = c.rebuild
     LEFT JOIN plans p ON p.rebuild = c.rebuild AND p.category = c.category WHERE sold IS NOT NULL AND p.cents IS NULL GROUP BY 1`,
    `SELECT category, count(DISTINCT rebuild), sum(cents) FROM lines JOIN rebuilds ON rebuild = id
     WHERE surprise AND sold IS NOT NULL GROUP BY 1`,
    `WITH ${PLANNED} SELECT seen, ${SPREAD}, sum(s::INTEGER) FROM k GROUP BY 1`,
    `WITH ${PLANNED} SELECT year(sold), ${SPREAD} FROM k GROUP BY 1`,
    `WITH h AS (SELECT own + paid - planned AS over, planned AS e, (own + paid - planned) / planned AS o FROM rebuilds
       WHERE sold IS NOT NULL) SELECT ${SPREAD} FROM h`,
  ],
  'time-to-sell': [
    ...['0', 'class'].map(
      (
        by,
      ) => `WITH d AS (SELECT ${by} AS g, coalesce(sold, DATE '${TODAY}') - listed AS t, sold IS NOT NULL AS e FROM rebuilds
         WHERE listed IS NOT NULL), n AS (SELECT g, t, count(*) FILTER (e) AS sold, count(*) AS out FROM d GROUP BY ALL),
       r AS (SELECT *, sum(out) OVER (PARTITION BY g ORDER BY t DESC) AS risk FROM n)
     SELECT g, t, risk, sold, exp(sum(ln(1 - sold / risk + 1e-12)) OVER (PARTITION BY g ORDER BY t)),
       sum(sold / (risk * (risk - sold + 1e-12))) OVER (PARTITION BY g ORDER BY t) FROM r WHERE sold > 0 ORDER BY 1, 2`,
    ),
    `SELECT median(ready - started), median(sold - bought), quantile_cont(ready - started, [0.1, 0.9]),
       quantile_cont(sold - bought, [0.1, 0.9]) FROM rebuilds`,
    `SELECT id, bought, listed, purchase + coalesce(sum(cents), 0) FROM rebuilds LEFT JOIN lines ON rebuild = id AND day <= DATE '${TODAY}'
     WHERE sold IS NULL GROUP BY id, bought, listed, purchase ORDER BY bought LIMIT 300`,
  ],
  contingency: [
    `WITH ${PLANNED} SELECT count(*), list_sort(list(o))[CAST(ceil((count(*) + 1) * 0.8) AS INTEGER)], sum(over), sum(e) FROM k`,
    `WITH ${PLANNED} SELECT damage, count(*), median(o), quantile_cont(o, [0.1, 0.9]),
       list_sort(list(o))[CAST(ceil((count(*) + 1) * 0.8) AS INTEGER)] FROM k GROUP BY 1`,
    `WITH ${PLANNED}, c AS (SELECT greatest(0, ceil(100 * sum(over - u) / sum(e))) AS p FROM k)
     SELECT any_value(p), list_sort(list(over - ceil(p * e / 100)))[CAST(ceil((count(*) + 1) * 0.8) AS INTEGER)] FROM k, c`,
    `WITH ${PLANNED}, w AS (SELECT i.id, i.sold, i.e, i.over, count(*) AS n,
         list_sort(list(h.o))[CAST(ceil((count(*) + 1) * 0.8) AS INTEGER)] AS uplift
       FROM k i JOIN k h ON h.sold < i.bought GROUP BY ALL HAVING count(*) >= 5)
     SELECT id, sold, over, uplift, over <= ceil(greatest(0, uplift) * e), over <= ceil(0.1 * e), over <= ceil(0.15 * e),
       over <= ceil(0.2 * e), over <= ceil(0.25 * e) FROM w ORDER BY sold, id`,
  ],
} as const;
