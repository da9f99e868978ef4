import type { Meaning } from '#shared/contracts/import-reading.ts';
import { fold } from '../cells/fold.ts';
import { weekdayOf } from './weekdays.ts';

/** What a heading may mean, the likelier first; which it is, the cells below decide. */
const HEADINGS: Readonly<Partial<Record<Meaning, string>>> = {
  date: 'week of|week|week starting|week ending|woche|woche vom|semana|semaine|date|day|when|paid on|date paid|invoice date|datum|tag|belegdatum|fecha|date achat|entered|posted|post date|posting date|transaction date|trans date|purchase date|date purchased|purchased|purchased on|date of purchase|bought|bought on|date spent|expense date|receipt date|bill date|date of bill|dated|day of|paid|rechnungsdatum|buchungstag|buchungsdatum|kaufdatum|datum kauf|am|wann|fecha factura|fecha gasto|fecha compra|fecha de compra|dia|cuando|jour|date facture|date d achat|le|quand|wk of|w c|w e|week beginning|week commencing|wk|kw|semaine du|semana del|semana de|datum von',
  vehicle:
    'vehicle|car|unit|truck|which car|vehicle year model|car name|year make model|auto|fahrzeug|wagen|kfz|pkw|coche|vehiculo|voiture|vehicule|rebuild|project|job|which one|which vehicle|what car|what vehicle|for car|for which car|vehicle name|car vehicle|car truck|automobile|ride|veh|vehicle description|yr make model|year make and model|car year|model year make|kraftfahrzeug|fahrzeug modell|fahrzeugtyp|wagen modell|autos|carro|vehiculos|coches|modelo coche|voitures|vehicules|auto modele|projekt|proyecto|projet|flip|build',
  category:
    'category|cat|catg|rubrik|rubro|rubrique|poste|type|what for|kind|cost type|expense type|account|class of cost|art|kategorie|kostenart|categoria|categorie|tipo|expense category|expense|spent on|group|bucket|section|cost category|cost group|cost class|kind of cost|nature|code|kategorien|aufwandsart|ausgabenart|posten|kostenstelle|clase|clase de gasto|tipo de gasto|tipo gasto|partida|nature de depense|type de depense|famille',
  what: 'what|description|item|details|detail|desc|memo|for|purpose|beschreibung|artikel|bezeichnung|text|descripcion|concepto|designation|what was it|what it was|what for exactly|item description|part|parts|part name|piece|pieza|piece designation|line item|reason|for what|work|was|wofur|leistung|position|verwendungszweck|bemerkung|artikelbezeichnung|ware|teil|detalle|detalles|articulo|repuesto|que|libelle|objet|intitule|article|quoi|notes|note|comment|comments|remarks',
  vendor:
    'vendor|from|bought from|supplier|seller|store|shop|who from|payee|paid to|where|handler|lieferant|verkaufer|proveedor|fournisseur|bought at|purchased from|source|supplier name|merchant|company|business|dealer|who got paid|paid to whom|to|at|place|wo|bei|von|firma|handler lieferant|lieferant handler|empfanger|geschaft|comercio|tienda|empresa|donde|a quien|magasin|chez|vendeur|commercant|enseigne|ou',
  foreseen:
    'planned|planned y n|foreseen|expected|in estimate|in budget|surprise|geplant|previsto|prevu|planned for|planned or surprise|plan|on the estimate|was it planned|planned yes no|surprise y n|surprise planned|estimated y n|anticipated|in kv|eingeplant|vorgesehen|estaba previsto|planeado|etait prevu|prevu o n',
  amount:
    'amount|actual|actual cost|real cost|amt|cost|paid|price|total|sum|spent|expense|debit|out|money|cost usd|net cost|betrag|ausgabe|ausgaben|preis|kosten|summe|importe|coste|gasto|montant|depense|how much|total paid|amount paid|paid out|out of pocket|gross|gross amount|total amount|line total|ext|extended|ext price|extended price|amount spent|cash out|money out|outflow|withdrawal|expenses|spend|actual amount|actual paid|usd|eur|gbp|dollars|euro|betrag eur|betrag brutto|brutto|bruttobetrag|endbetrag|rechnungsbetrag|gesamtbetrag|gesamtpreis|zahlung|ausgang|belastung|bezahlt|tatsachlich|ist|istkosten|ist kosten|importe total|importe eur|total eur|gastos|pagado|salida|debe|cargo|precio|precio total|coste real|costo|monto|valor|montant ttc|ttc|total ttc|prix ttc|prix total|prix|paye|cout|cout reel|reel|sortie|depenses|sorties|debits|real|soll|net amount|net|netto|nettobetrag|montant ht|ht|neto|importe neto',
  credit:
    'got back|credit|refund|refunds|returned|back|income|received|sale|sales|in|einnahme|einnahmen|gutschrift|erstattung|ingreso|recette|sold for|sale price|money in|cash in|inflow|deposit|credits|refund amount|core back|returns|proceeds|haben|eingang|zufluss|erlos|ingresos|entrada|haber|entradas|abonos|recettes|encaissement|entree|entrees|vente|venta|verkauf',
  'stock number':
    'stock|car no|car id|car number|vehicle no|vehicle id|vehicle number|auto nr|auto no|wagen nr|kfz nr|fahrzeug nr|coche no|no coche|vehiculo no|voiture no|no voiture|vehicule no|no vehicule|stock no|stock number|stock nr|id|no|nr|number|tag|ref|unit no|lot|lot no|our no|lagernummer|fahrzeugnr|stk|stk no|stock id|car code|vehicle code|file no|project no|project number|job no|job number|deal no|asset|asset no|inventory no|inventory number|kennung|lfd nr|lfd no|laufende no|auftrag|auftrag no|akte|referencia|expediente|reference|dossier|no dossier|no ref|matricule',
  year: 'year|yr|model year|my|baujahr|bj|jahr|ano|annee|yr built|year built|built|ez|erstzulassung|modelljahr|ano modelo|annee modele|millesime',
  make: 'make|brand|manufacturer|marke|hersteller|marca|marque|mfr|mfg|make model brand|fabricante|constructeur',
  model: 'model|modell|typ|modelo|modele|car model|vehicle model|model name|fahrzeugmodell|modellreihe',
  trim: 'trim|version|ausstattung',
  vin: 'vin|vin no|vin number|fahrgestellnummer|fin|bastidor|vin last 6|last 6 of vin|last six|vin last six|serial|serial no|chassis|chassis no|fahrgestellno|fg no|no bastidor|no de chassis|no serie',
  class:
    'class|type|body|body type|body style|vehicle type|vehicle class|klasse|bauart|segment|size|kind of car|fahrzeugklasse|fahrzeugart|tipo vehiculo|clase|categorie vehicule|carrosserie type',
  damage:
    'damage|golpe|choc|dmg|hit|primary damage|loss|damage type|schaden|dano|dommage|what happened|what hit|damage area|damaged|area hit|where hit|hit where|loss type|condition|schadenart|schadensart|unfallschaden|schaden an|danos|tipo dano|siniestro|tipo de dano|degats|type de choc|sinistre|etat',
  'second damage': 'second damage|secondary damage|other damage|damage 2',
  'title brand':
    'title|title type|title status|title brand|brand on title|papiere|titulo|papeles|clean title|title kind|title state|docs status|fahrzeugbrief|brief|documentacion|carte grise statut',
  odometer:
    'miles|mileage|odometer|odo|km|kilometer|kilometerstand|kms|mi|odometer reading|odo reading|miles in|km stand|laufleistung|tachostand|kilometros|kilometraje|kilometrage|kms compteur',
  seen: 'seen|inspected before|seen in person|looked at|seen before',
  'bought from':
    'bought from|auction|source|bought at|from|seller|purchased from|auction house|source auction|where bought|gekauft bei|gekauft von|verkaufer|comprado a|vendedor|subasta|achete a|achete chez|encheres|vendeur',
  notes:
    'notes|note|comments|comment|remarks|bemerkung|bemerkungen|notiz|notas|remarques|memo|observaciones|observations|anmerkung|anmerkungen|observacion|commentaire|commentaires|misc notes|status|stand|estado|statut',
  boughtOn:
    'bought|bought on|purchased|date purchase|date of purchase|date purchased|fecha compra|fecha de compra|date d achat|comprado el|purchase date|date bought|buy date|gekauft|gekauft am|kaufdatum|comprado|achete|date in|in date|bought date|date acquired|acquired|acquired on|acquisition date|date won|won|auction date|day bought|einkaufsdatum|ankaufsdatum|kauf am|angekauft|angekauft am|einkauf am|f compra|adquirido|adquisicion|dia compra|achete le|acquis le|date acquisition|in',
  paidOn: 'paid|paid on|date paid|bezahlt|bezahlt am|pagado el|paye le|payment date',
  pickedUpOn:
    'picked up|pick up|pickup|arrived|abgeholt|date picked up|picked up on|pickup date|date towed|towed on|geholt|abholung|abgeholt am|recogido|recogida|enleve le|recupere le|date arrived|delivered on',
  startedOn:
    'started|start|start date|begun|work started|begonnen|work start|date started|started on|start work|begonnen am|arbeitsbeginn|empezado|inicio|inicio trabajo|debut|commence le|debut travaux',
  roadworthyOn:
    'ready|roadworthy|done|finished|completed|road ready|fertig|listo|pret|terminado|fini|date ready|ready on|ready date|ready by|date done|done on|date finished|finished on|completed on|completion date|date completed|fertig am|fertiggestellt|fertigstellung|terminado el|fecha listo|fecha fin|fin|pret le|fini le|termine le|fin travaux|on the road',
  inspectedOn:
    'inspected|inspected on|inspection date|tuv am|date inspected|passed inspection|inspection passed|hu am|abnahme am|fecha itv|itv el|ct le|date ct',
  titleIssuedOn:
    'title issued|title date|title received|titled|title in hand|title back|title arrived|date title|got title|papeles el',
  listedOn:
    'listed|listed on|list date|advertised|inseriert|date listed|posted on|advertised on|ad date|for sale since|listing date|inseriert am|anzeige am|anunciado|anunciado el|publicado|annonce le|mis en vente|en vente le',
  soldOn:
    'sold on|sold|date sold|sale date|sold date|verkauft|verkauft am|verkaufsdatum|vendido|vendu|fecha venta|fecha de venta|date vente|date de vente|vendido el|vendu le|date out|out date|date of sale|day sold|sold on date|vk am|vk datum|verkauf am|datum verkauf|f venta|vendido fecha|vendida el|date de cession|vendue le|sortie le|out',
  settledOn: 'settled|settled on|closed|abgerechnet',
  purchase:
    'bid|precio compra|precio de compra|compra|prix achat|prix d achat|achat|einkaufspreis|price paid|purchase|purchase price|price|paid|bought for|cost of car|hammer|buy price|kaufpreis|zuschlag|einkauf|bid price|winning bid|hammer bid|hammer price|price of car|car cost|car price|cost of vehicle|vehicle cost|vehicle price|paid for it|paid for car|gave|gave for it|bought at|buy|buy in|buy in price|bid amount|auction price|purchase cost|purchase amount|acquisition cost|ek|ek preis|einkauf preis|ankauf|ankaufpreis|ankaufspreis|kauf|kaufpreis netto|bezahlt|gebot|gekauft fur|pagado|precio coche|precio de subasta|coste compra|coste de compra|importe compra|comprado por|compra coche|prix|prix paye|prix voiture|cout achat|cout d achat|paye|montant achat|achete pour|prix adjuge|adjudication',
  hours:
    'hours|hrs|own hours|hrs worked|labor hours|my hours|time|std|stunden|horas|heures|hour|total hours|hours worked|hrs spent|hours spent|hours total|total hrs|own hrs|labor hrs|labour hours|shop hours|man hours|my hrs|my time|time spent|duration|h|arbeitsstunden|arbeitszeit|dauer|zeit|std gesamt|stunden gesamt|eigene stunden|eigenstunden|horas propias|horas trabajadas|horas totales|total horas|tiempo|duracion|heures travaillees|heures passees|total heures|temps|temps passe|duree|nb heures|nombre d heures',
  'estimated hours':
    'est hours|est hrs|estimated hours|hours est|hrs est|planned hours|budget hours|stunden geplant|est time|hours planned|hours budgeted|hours quoted|plan hours|std soll|soll std|stunden soll|soll stunden|horas previstas|horas prev|heures prevues|h prevues',
  sale: 'sold for|sale|sale price|sold|selling price|sold price|verkaufspreis|verkauft fur|erlos|precio venta|precio de venta|prix vente|prix de vente|venta|vente|verkauf|got|got for it|sold at|sold amount|sale amount|sales price|selling|sell price|sell|received|sale proceeds|proceeds|final sale|final price|went for|vk|vk preis|verkauf preis|verkaufserlos|verkaufsbetrag|verkauft zu|vendido por|vendido en|importe venta|vendu pour|vendu|prix vendu|montant vente|prix de cession|vendido|vendida|vendue|verkauft',
  asking:
    'asking|asking price|list price|ask|asked|asking for|list|listed at|listed for|advertised at|advertised for|sticker|want|inserat preis|inseratspreis|angebotspreis|wunschpreis|vb|vhb|precio anuncio|precio pedido|pedido|anunciado por|prix annonce|prix affiche|prix demande|demande',
  'expected sale':
    'expected sale|est sale|expected price|arv|target sale|target price|expected sale price|hope to get|hoped for|projected sale|projected price|projected sale price|market value|retail value|book value|value when done|expected value|soll vk|erwarteter vk|erwarteter verkaufspreis|vk soll|venta prevista|precio previsto|precio objetivo|valor mercado|prix espere|vente prevue|prix vise|valeur marche',
  person:
    'who|person|worker|mechanic|name|by|wer|mitarbeiter|nombre|nom|operario|mecanico|mecanicien|quien|qui|tech|technician|employee|staff|hand|helper|whose hours|done by|worked by|worker name|initials|mechaniker|monteur|schrauber|arbeiter|von wem|trabajador|empleado|tecnico|mecano|ouvrier|salarie|intervenant|technicien|operateur|par',
  task: 'task|did what|job|work|what done|work done|tatigkeit|arbeit|tarea|trabajo|tache|travail|activity|what was done|what we did|work performed|work description|job done|description of work|description|what|details|notes|operation|arbeiten|beschreibung|was|was gemacht|verrichtung|arbeitsgang|labor realizada|trabajos|descripcion|operacion|que se hizo|descripcion trabajo|travaux|tache effectuee|travail effectue|description travaux|libelle|comments|remarks',
  derived:
    'total in|total|all in|total cost|total costs|total spent|cost total|total invested|invested|profit|ganancia|benefice net|resultado|resultat|net profit|gain|loss|profit loss|p l|margin|roi|days|days held|days to sell|balance|running total|running balance|saldo|gesamt|gesamtkosten|gewinn|summe|marge|beneficio|benefice|per hour|profit per hour|in it|total into it|into it|total outlay|outlay|cost basis|basis|sum of costs|total investment|all costs|costs total|total expense|total expenses|sum costs|total cost in|cost all in|net|net gain|made|we made|cleared|earned|earnings|diff|difference|over under|variance|delta|margin pct|profit pct|days owned|days in shop|dom|running|running profit|cumulative|cum profit|ytd|remaining|bal|per hr|hourly|earned per hour|rate|hourly rate|unit price|price each|each|unit cost|kosten gesamt|einsatz|kosten summe|summe kosten|gewinn verlust|ertrag|ergebnis|uberschuss|abweichung|differenz|marge pct|standtage|tage|stundenlohn|einzelpreis|stuckpreis|kontostand|restbetrag|coste total|costes totales|costo total|gasto total|gastos totales|total gastos|total gastado|total invertido|inversion|ganancia neta|perdida|beneficio neto|diferencia|desviacion|dias|saldo acumulado|precio unitario|precio unidad|cout total|couts totaux|total depenses|depenses totales|total investi|prix de revient|revient|perte|marge nette|ecart|solde|jours|taux horaire|prix unitaire|pu|dont tva|tva incluse|enthaltene mwst|iva incluido|tax incl|incl tax|of which tax|net amount|montant ht|netto|subtotal|sub total',
};

const BY_WORDS = new Map<string, Meaning[]>();
const RANKS = new Map<Meaning, ReadonlyMap<string, number>>();
for (const [meaning, list] of Object.entries(HEADINGS) as [Meaning, string][]) {
  const phrases = [...new Set(list.split('|'))];
  RANKS.set(meaning, new Map(phrases.map((phrase, rank) => [phrase, rank])));
  for (const phrase of phrases) BY_WORDS.set(phrase, [...(BY_WORDS.get(phrase) ?? []), meaning]);
}
const UNIT =
  /[([]\s*(?:usd|eur|gbp|cad|chf|\$|€|£|us\$|euros?|dollars?|h|hrs?|hours|std\.?|stunden|horas|heures|km|mi|miles|y\/n|j\/n|s\/n|o\/n|ttc|dd.?mm.?yyyy|mm.?dd.?yyyy)\s*[)\]]/gi;
const PLAN =
  /\b(?:ests?|estim|estimates?|estimated|estimation|budget|budgeted|budgets|bud|plan|planned|quotes?|quoted|forecast|projected|guess|geplante?|soll|kv|kva|kostenvoranschlag|voranschlag|schatzung|geschatzt|prev|previstos?|previstas?|presupuesto|presup|estimad[oa]s?|planead[oa]s?|prevus?|prevues?|devis|budgete|estimee?s?)\b/;
const ACTUAL =
  /\b(?:act|actuals?|real|really|reale?s|reels?|reelle?s?|ist|tatsachliche?|spent|final|gastad[oa]s?|efectivos?|effectifs?|paid|bezahlt|pagad[oa]s?|payee?s?)\b/;

/** A heading without units and punctuation, as compared. */
export function headingWords(heading: string): string {
  if (/^\s*[$€£]+\s*$/.test(heading)) return 'amount';
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

/** How usual a heading is for a meaning: 0 = the usual word, 1 and more = less so; null = it is not known for it. */
export function headingRank(heading: string, meaning: Meaning): number | null {
  const phrases = RANKS.get(meaning);
  return (
    phrases?.get(headingWords(heading)) ?? phrases?.get(headingWords(heading.replace(/[([].*[)\]]/g, ' '))) ?? null
  );
}

const BUYING = words(
  'ek buy buying bought purchase purchased acquired acquisition won kauf kaufen gekauft ankauf angekauft einkauf compra comprado comprada adquirido achat achete acquis',
);
const SELLING = words(
  'sale sales sell selling sold verkauf verkauft vk venta vendido vendida vente vendu vendue cession',
);
const FILLING = words(
  `date dates day on at for price cost costs amount paid value usd eur gbp car vehicle truck the of in from to we it total actual final real
datum am fur preis betrag kosten fahrzeug auto wagen kfz summe fecha el de del la precio importe coste por coche vehiculo dia f
le la l du d prix montant cout jour voiture vehicule pour a`,
);

function words(list: string): ReadonlySet<string> {
  return new Set(list.split(/\s+/));
}

/**
 * Does a heading speak of nothing but the buying, or the selling, of the vehicle (`Date purchased`, `Prix d'achat`)? Whether
 * it is the day or the money, the cells tell. null = it speaks of something else.
 */
export function dealOf(heading: string): 'buying' | 'selling' | null {
  const all = headingWords(heading).split(' ');
  const deals = all.filter((word) => !FILLING.has(word));
  if (deals.length === 0) return null;
  if (deals.every((word) => BUYING.has(word))) return 'buying';
  return deals.every((word) => SELLING.has(word)) ? 'selling' : null;
}

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

/** A heading without a word that only says that the figure is the actual one (`Parts act.` → `parts`). */
export function actualPart(heading: string): string {
  return headingWords(heading).replace(ACTUAL, ' ').replace(/\s+/g, ' ').trim();
}

const TOTAL =
  /^(?:(?:grand|sub|car|month|monthly|year|yearly|running|overall|page|job|vehicle|unit)?\s?(?:totals?|subtotals?|sums?)|summe|zwischensumme|endsumme|gesamt(?:summe|betrag|kosten)?|monatssumme|suma|somme|sous total|sous totaux|subtotales?|totaux|totales)\b|\b(?:totals?|subtotals?|summe|gesamt|totaux|totales)$/;
const CARRIED =
  /^(?:(?:balance )?(?:carried|brought) (?:forward|over|down)\b.*|balance(?: forward.*| from .*| as of .*)?|(?:opening|closing|starting|previous|ending|last) balance|carry ?(?:over|forward)|forward|[bc] f(?:wd)?|ubertrag\b.*|vortrag\b.*|saldovortrag|anfangsbestand|endbestand|saldo(?: anterior| inicial| final)?|suma y sigue|suma anterior|arrastre|viene de.*|pasa a .*|report|a reporter|reporte|solde(?: anterieur| initial| final| reporte)?|report a nouveau)$/;

const ALL = new Set(['all', 'all cars', 'alle', 'alles', 'insgesamt', 'todo', 'todos', 'tout', 'tous', 'ensemble']);

/** Does a cell label a total, subtotal or carried-forward line? */
export function isTotalLabel(cell: string): boolean {
  const words = cell.length < 60 ? fold(cell) : '';
  return TOTAL.test(words) || ALL.has(words) || CARRIED.test(words);
}

/** Does a cell label a balance that is only carried from one page or sheet to the next? */
export function isCarriedLabel(cell: string): boolean {
  return cell.length < 60 && CARRIED.test(fold(cell));
}
