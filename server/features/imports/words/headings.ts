import type { Meaning } from '#shared/contracts/import-reading.ts';
import { fold } from '../cells/fold.ts';
import { weekdayOf } from './weekdays.ts';

/** What a heading may mean, the likelier first; which it is, the cells below decide. */
const HEADINGS: Readonly<Partial<Record<Meaning, string>>> = {
  date: 'week of|week|week starting|week ending|woche|woche vom|semana|semaine|date|day|when|paid on|date paid|invoice date|datum|tag|belegdatum|fecha|date achat',
  vehicle:
    'vehicle|car|unit|truck|which car|vehicle year model|car name|year make model|auto|fahrzeug|wagen|kfz|pkw|coche|vehiculo|voiture|vehicule|rebuild|project|job',
  category:
    'category|cat|catg|rubrik|rubro|rubrique|poste|type|what for|kind|cost type|expense type|account|class of cost|art|kategorie|kostenart|categoria|categorie|tipo',
  what: 'what|description|item|details|detail|desc|memo|for|purpose|beschreibung|artikel|bezeichnung|text|descripcion|concepto|designation',
  vendor:
    'vendor|from|bought from|supplier|seller|store|shop|who from|payee|paid to|where|handler|lieferant|verkaufer|proveedor|fournisseur',
  foreseen: 'planned|planned y n|foreseen|expected|in estimate|in budget|surprise|geplant|previsto|prevu',
  amount:
    'amount|actual|actual cost|real cost|amt|cost|paid|price|total|sum|spent|expense|debit|out|money|cost usd|net cost|betrag|ausgabe|ausgaben|preis|kosten|summe|importe|coste|gasto|montant|depense',
  credit:
    'got back|credit|refund|refunds|returned|back|income|received|sale|sales|in|einnahme|einnahmen|gutschrift|erstattung|ingreso|recette|sold for|sale price',
  'stock number':
    'stock|car no|car id|car number|vehicle no|vehicle id|vehicle number|auto nr|auto no|wagen nr|kfz nr|fahrzeug nr|coche no|no coche|vehiculo no|voiture no|no voiture|vehicule no|no vehicule|stock no|stock number|stock nr|id|no|nr|number|tag|ref|unit no|lot|lot no|our no|lagernummer|fahrzeugnr',
  year: 'year|yr|model year|my|baujahr|bj|jahr|ano|annee',
  make: 'make|brand|manufacturer|marke|hersteller|marca|marque',
  model: 'model|modell|typ|modelo|modele',
  trim: 'trim|version|ausstattung',
  vin: 'vin|vin no|vin number|fahrgestellnummer|fin|bastidor',
  class: 'class|type|body|body type|body style|vehicle type|vehicle class|klasse|bauart',
  damage: 'damage|golpe|choc|dmg|hit|primary damage|loss|damage type|schaden|dano|dommage',
  'second damage': 'second damage|secondary damage|other damage|damage 2',
  'title brand': 'title|title type|title status|title brand|brand on title|papiere|titulo|papeles',
  odometer: 'miles|mileage|odometer|odo|km|kilometer|kilometerstand|kms',
  seen: 'seen|inspected before|seen in person|looked at|seen before',
  'bought from': 'bought from|auction|source|bought at|from',
  notes: 'notes|note|comments|comment|remarks|bemerkung|bemerkungen|notiz|notas|remarques',
  boughtOn:
    'bought|bought on|purchased|date purchase|date of purchase|date purchased|fecha compra|fecha de compra|date d achat|comprado el|purchase date|date bought|buy date|gekauft|gekauft am|kaufdatum|comprado|achete',
  paidOn: 'paid|paid on|date paid|bezahlt',
  pickedUpOn: 'picked up|pick up|pickup|arrived|abgeholt',
  startedOn: 'started|start|start date|begun|work started|begonnen',
  roadworthyOn: 'ready|roadworthy|done|finished|completed|road ready|fertig|listo|pret|terminado|fini',
  inspectedOn: 'inspected|inspected on|inspection date|tuv am',
  titleIssuedOn: 'title issued|title date|title received|titled',
  listedOn: 'listed|listed on|list date|advertised|inseriert',
  soldOn:
    'sold on|sold|date sold|sale date|sold date|verkauft|verkauft am|verkaufsdatum|vendido|vendu|fecha venta|fecha de venta|date vente|date de vente|vendido el|vendu le',
  settledOn: 'settled|settled on|closed|abgerechnet',
  purchase:
    'bid|precio compra|precio de compra|compra|prix achat|prix d achat|achat|einkaufspreis|price paid|purchase|purchase price|price|paid|bought for|cost of car|hammer|buy price|kaufpreis|zuschlag|einkauf',
  hours: 'hours|hrs|own hours|hrs worked|labor hours|my hours|time|std|stunden|horas|heures|hour|total hours',
  'estimated hours': 'est hours|est hrs|estimated hours|hours est|hrs est|planned hours|budget hours|stunden geplant',
  sale: 'sold for|sale|sale price|sold|selling price|sold price|verkaufspreis|verkauft fur|erlos|precio venta|precio de venta|prix vente|prix de vente|venta|vente|verkauf',
  asking: 'asking|asking price|list price|ask',
  'expected sale': 'expected sale|est sale|expected price|arv|target sale|target price',
  person: 'who|person|worker|mechanic|name|by|wer|mitarbeiter|nombre|nom|operario|mecanico|mecanicien|quien|qui',
  task: 'task|did what|job|work|what done|work done|tatigkeit|arbeit|tarea|trabajo|tache|travail',
  derived:
    'total in|total|all in|total cost|total costs|total spent|cost total|total invested|invested|profit|ganancia|benefice net|resultado|resultat|net profit|gain|loss|profit loss|p l|margin|roi|days|days held|days to sell|balance|running total|running balance|saldo|gesamt|gesamtkosten|gewinn|summe|marge|beneficio|benefice|per hour|profit per hour',
};

const BY_WORDS = new Map<string, Meaning[]>();
for (const [meaning, phrases] of Object.entries(HEADINGS) as [Meaning, string][]) {
  for (const phrase of phrases.split('|')) BY_WORDS.set(phrase, [...(BY_WORDS.get(phrase) ?? []), meaning]);
}
const UNIT =
  /[([]\s*(?:usd|eur|gbp|cad|\$|€|£|us\$|h|hrs?|hours|std|km|mi|miles|y\/n|dd.?mm.?yyyy|mm.?dd.?yyyy)\s*[)\]]/gi;
const PLAN = /\b(?:est|estimate|estimated|budget|budgeted|plan|planned|quote|quoted|geplant|soll|kv)\b/;

/** A heading without units and punctuation, as compared. */
export function headingWords(heading: string): string {
  return fold(heading.replace(UNIT, ' ').replace(/#|№|\bn[º°](?!\p{L})/giu, ' no '));
}

/** Every meaning that this heading is known for. */
export function headingMeanings(heading: string): readonly Meaning[] {
  if (weekdayOf(heading) !== null) return ['hours'];
  return BY_WORDS.get(headingWords(heading)) ?? BY_WORDS.get(headingWords(heading.replace(/[([].*[)\]]/g, ' '))) ?? [];
}

const SMALL = new Set([
  'de',
  'del',
  'la',
  'el',
  'los',
  'of',
  'the',
  'for',
  'du',
  'des',
  'le',
  'der',
  'die',
  'das',
  'in',
]);
const MOST_WORDS = 3;

/** What a heading may mean by a part of it, when the whole is not known: `Tipo de gasto`, `Date of bill`. */
export function likelyMeanings(heading: string): readonly Meaning[] {
  const exact = headingMeanings(heading);
  if (exact.length > 0) return exact;
  const words = headingWords(heading)
    .split(' ')
    .filter((word) => !SMALL.has(word));
  const found = new Set<Meaning>(BY_WORDS.get(words.join(' ')) ?? []);
  for (let size = Math.min(MOST_WORDS, words.length - 1); size > 0; size--) {
    for (let at = 0; at + size <= words.length; at++) {
      for (const meaning of BY_WORDS.get(words.slice(at, at + size).join(' ')) ?? []) found.add(meaning);
    }
  }
  const named = (['year', 'make', 'model'] as const).filter((meaning) => found.has(meaning));
  return named.length >= 2 ? ['vehicle'] : [...found];
}

/** The heading of a planned figure without the word that says so (`Parts est.` → `parts`); null = no such word. */
export function plannedPart(heading: string): string | null {
  const words = headingWords(heading);
  return PLAN.test(words) ? words.replace(PLAN, ' ').replace(/\s+/g, ' ').trim() : null;
}

const TOTAL =
  /^(?:(?:grand|sub|car|month|monthly|year|running|overall)?\s?(?:total|totals|subtotal|sum|sums)|summe|gesamt|gesamtsumme|zwischensumme|ubertrag|suma|total general|somme|sous total|subtotales?|totaux|totales|carried forward|brought forward|balance)\b|\b(?:total|totals|subtotal|summe|gesamt)$/;

const ALL = new Set(['all', 'all cars', 'alle', 'alles', 'insgesamt', 'todo', 'todos', 'tout', 'tous', 'ensemble']);

/** Does a cell label a total, subtotal or carried-forward line? */
export function isTotalLabel(cell: string): boolean {
  const words = cell.length < 60 ? fold(cell) : '';
  return TOTAL.test(words) || ALL.has(words);
}
