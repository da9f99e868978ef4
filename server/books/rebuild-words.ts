/** What a rebuild is called beside its tag: "2014 Orrin Vale", else its class. For a query that joins `vehicle_classes c`. */
export const NAME_SQL = `coalesce(nullif(trim(concat_ws(' ', r.year, r.make, r.model)), ''), c.name, '')`;

/** Where a rebuild stands, read from its dates (the words of `Stage`). */
export const STAGE_SQL = `CASE
  WHEN r.sold_on IS NOT NULL THEN 'sold' WHEN r.exit_kind IS NOT NULL THEN r.exit_kind
  WHEN r.listed_on IS NOT NULL THEN 'listed' WHEN r.roadworthy_on IS NOT NULL THEN 'ready'
  WHEN r.started_on IS NOT NULL THEN 'in the shop' ELSE 'bought' END`;

/** Has it not left the shop yet? */
export const OPEN_SQL = 'r.sold_on IS NULL AND r.exit_kind IS NULL';
