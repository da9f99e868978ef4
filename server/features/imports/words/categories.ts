import { fold } from '../cells/fold.ts';

/** What a category word may mean beside a category of the shop. */
export const PURCHASE = 'purchase';
export const SALE = 'sale';

// Meaning | whole phrases, folded. Longer phrases win over shorter ones inside the same text.
const PHRASES: Readonly<Record<string, string>> = {
  [PURCHASE]:
    'purchase|purchased|purchase price|auction price|price at auction|auction bid|bid|hammer|hammer price|winning bid|buy|bought|bought for|buy price|vehicle cost|car price|vehicle price|cost of car|kauf|kaufpreis|einkauf|ankauf|zuschlag|compra|comprado|subasta|puja|achat|achete|enchere|the car|the vehicle|the truck|purchase of car|purchase of vehicle|vehicle purchase|car purchase|cost of vehicle|paid for car|acquisition|bid price|hammer bid|private purchase|fahrzeugkauf|autokauf|erwerb|anschaffung|zuschlagspreis|gebot|ek|ek preis|einkaufspreis|compra vehiculo|compra coche|compra del coche|precio compra|adquisicion|remate|achat vehicule|achat voiture|prix achat|prix d achat|acquisition|adjudication|prix d adjudication',
  [SALE]:
    'sale|sold|sale price|sold for|sold price|selling price|verkauf|verkauft|verkaufspreis|erlos|venta|vendido|vendida|vente|vendu|vendue|sales|vehicle sale|car sale|sale of car|sale proceeds|proceeds|sold car|sold it|fahrzeugverkauf|autoverkauf|vk|vk preis|verkaufserlos|venta vehiculo|venta coche|precio venta|vente vehicule|vente voiture|prix vente|prix de vente|cession',
  'auction fees':
    'auction fee|auction fees|auction|buyer fee|buyers fee|buyer s fee|buyer fees|fee|fees|gate fee|bid fee|broker fee|aufgeld|auktionsgebuhr|auktionsgebuhren|auktion|gebuhr|gebuhren|comision subasta|tasas subasta|comision|frais encheres|frais d encheres|frais de vente aux encheres|auction cost|auction costs|auction cut|buyers premium|buyer premium|buyer s premium|internet fee|online fee|virtual bid fee|doc fee|documentation fee|auktionskosten|auktionsgeb|auktionsgebuehr|kaufergebuhr|kauferaufgeld|comision de subasta|tasas|tasa subasta|gastos subasta|gastos de subasta|frais|frais enchere|frais d enchere|frais acheteur|frais de dossier|commission enchere',
  transport:
    'transport|transportation|tow|towing|tow fee|tows|haul|hauling|delivery|freight|shipping|storage|yard storage|pickup fee|abschleppen|abschleppkosten|uberfuhrung|grua|traslado|transporte|remorquage|depannage|tow home|tow in|tow bill|ship|carrier|trailer rental|flatbed|pick up|pickup|transport home|abschleppdienst|uberfuhrungskosten|spedition|transportkosten|remolque|portes|porte|remorque|convoyage|acheminement|transport retour',
  parts:
    'part|parts|used parts|new parts|body parts|mechanical parts|teile|ersatzteil|ersatzteile|gebrauchtteile|tires|tyres|tire|wheels|battery|reifen|repuestos|piezas|pieces|donor|donor car|parts cost|parts costs|parts and supplies|parts supplies|parts bought|parts used|parts total|total parts|part cost|oem parts|aftermarket parts|aftermarket|salvage parts|junkyard parts|junkyard|components|spare parts|spares|teilekosten|autoteile|neuteile|altteile|ersatzteilkosten|recambios|repuesto|recambio|piezas usadas|piezas nuevas|neumaticos|refacciones|piece|pieces detachees|pieces auto|pieces occasion|pieces neuves|pneus',
  'outside labor (sublet)':
    'outside labor|outside labour|body|outside work|outside|sublet|sublets|subcontract|subcontractor|body shop|bodyshop|body work|bodywork|frame|frame work|machine shop|machine work|welding|mechanic|shop labor|fremdleistung|fremdleistungen|fremdarbeit|werkstatt|karosserie|mano de obra externa|mano de obra|chapa|chapista|soldadura|taller externo|trabajo externo|sous traitance|carrosserie|redressage|soudure|main d oeuvre externe|sublet labor|sublet work|outside services|outside service|outside shop|outside help|paid help|hired help|hired labor|helper|day labor|contractor|contract labor|contract work|subbed out|frame shop|frame pull|paint shop|paint job|trim shop|alignment shop|glass shop|transmission shop|upholstery|fremdarbeiten|fremdleistung werkstatt|fremde arbeit|lohnarbeit|karosseriebau|lackierer|lackiererei|schlosser|externe werkstatt|mano obra externa|m o externa|trabajos externos|trabajos de terceros|terceros|subcontrata|subcontratacion|taller|planchista|chapa y pintura|sous traitant|main d oeuvre exterieure|travaux exterieurs|atelier exterieur|garage exterieur|carrossier|carrosserie externe|prestations|prestataire',
  'paint & body materials':
    'paint|paints|painting|paint body|paint and body|body paint|body and paint|paint materials|body materials|paint supplies|primer|primer and filler|clear coat|clear coat kit|base coat|filler|body filler|sandpaper|masking tape|spray paint|hardener|thinner|spachtel|schleifpapier|klarlack|basislack|lija|masilla|barniz|papier de verre|mastic|vernis|lack|lackierung|lackmaterial|farbe|pintura|peinture|paint mat|paint material|paint and materials|paint body materials|body shop materials|bondo|basecoat|clearcoat|lack und material|lackmaterialien|lackzubehor|grundierung|lackbedarf|pintura y material|pinturas|material pintura|material de pintura|pintura y barniz|imprimacion|peintures|peinture et vernis|produits peinture|appret',
  'restraints (SRS)': 'srs|airbag|airbags|air bag|air bags|restraint|restraints|seat belts|belts|gurte|gurt',
  'small systems':
    'glass|windshield|windscreen|key|keys|ac|a c|alignment|scan|scans|calibration|electronics|glas|scheibe|schlussel|klima|achsvermessung',
  'title & registration':
    'title|titles|title dmv|title plates|title and plates|title fees|dmv|registration|reg|plates|tags|tag title|license plates|zulassung|anmeldung|kennzeichen|matriculacion|papeles|gestoria|immatriculation|papiers|carte grise|title fee|title work|titling|dmv fees|title registration|title and registration|title reg|registration fees|plates and title|license|licence|licensing|tag and title|tags and title|title and tags|paperwork|kfz zulassung|ummeldung|zulassungskosten|schilder|transferencia|cambio de nombre|cambio nombre|matricula|tramites|documentacion|tasas dgt|cartes grises|immat|demarches|plaques',
  inspection:
    'inspection|inspections|inspect|rebuilt inspection|state inspection|safety inspection|smog|emissions|tuv|hu|hauptuntersuchung|hu au|itv|controle technique|controle|inspeccion|mot|state insp|inspection fee|inspection fees|safety check|smog check|emission|emissions test|salvage inspection|rebuilt insp|enhanced inspection|tuv hu|tuv au|tuv gebuhr|prufung|abnahme|gutachten|inspeccion tecnica|revision itv|ct|controle tech|visite technique',
  insurance:
    'insurance|ins|versicherung|seguro|assurance|insurance premium|liability|versicherungen|kfz versicherung|seguros|assurances',
  supplies:
    'supplies|supply|shop supplies|consumables|engine oil|motor oil|brake fluid|shop rags|welding wire|cutting discs|zip ties|shop rags and gloves|motorol|handschuhe|lappen|aceite de motor|huile moteur|materials|material|fluids|verbrauchsmaterial|hilfsmittel|material werkstatt|suministros|fournitures|shop supply|small stuff|consumable|shop materials|shop material|kleinmaterial|verbrauchsmaterialien|betriebsstoffe|werkstattbedarf|hilfsstoffe|consumibles|material fungible|suministro|insumos|consommables|petites fournitures|fournitures atelier',
  detail:
    'detail|detailing|cleaning|clean|wash|car wash|interior detail|aufbereitung|reinigung|limpieza|nettoyage|detailer|cleanup|clean up|interior cleaning|shampoo|wash and wax|fahrzeugaufbereitung|fahrzeugpflege|politur|limpieza y pulido|pulido|lavage|polissage',
  'selling costs':
    'ad|ads|advert|advertising|listing|listing fee|selling|selling cost|selling costs|sales cost|commission|photos|marketing|verkaufskosten|inserat|anzeige|anuncio|annonce|ad cost|ads and photos|advertisement|advertisements|classified|classifieds|listing fees|sale cost|sale costs|sales costs|sales commission|selling fee|selling fees|selling expense|selling expenses|anzeigen|inserate|inseratskosten|anzeigenkosten|verkaufsanzeige|anuncios|publicidad|gastos venta|gastos de venta|annonces|frais vente|frais de vente|publicite',
  tax: 'tax|taxes|sales tax|excise|vat|steuer|steuern|impuesto|taxe|use tax|purchase tax|tax paid|mwst|ust|umsatzsteuer|mehrwertsteuer|iva|impuestos|itp|tva|taxes et impots',
  'paid labor':
    'paid labor|paid labour|wages|wage|helper|helper pay|payroll|lohn|lohne|salario|salaires|personalkosten|gehalt|sueldo|sueldos|jornales',
  other:
    'other|misc|miscellaneous|various|sundry|sonstiges|sonstige|diverses|verschiedenes|otros|divers|other costs|other cost|other expenses|other expense|fuel|gas|benzin|tanken|sprit|kraftstoff|gasolina|combustible|essence|carburant|lodging|travel|meals|sonstige kosten|andere|andere kosten|otros gastos|varios|autres|autre|autres frais|frais divers',
};

const MEANING_OF = new Map(
  Object.entries(PHRASES).flatMap(([meaning, phrases]) =>
    phrases.split('|').map((phrase) => [phrase, meaning] as const),
  ),
);
const MOST_WORDS = 3;

/** The meaning of trade words; null = unknown. `isExact`: the whole text is a known phrase. */
export function tradeMeaning(text: string): { meaning: string; isExact: boolean } | null {
  const words = fold(text).split(' ');
  const whole = MEANING_OF.get(words.join(' '));
  if (whole) return { meaning: whole, isExact: true };
  for (let size = Math.min(MOST_WORDS, words.length); size > 0; size--) {
    for (let at = 0; at + size <= words.length; at++) {
      const meaning = MEANING_OF.get(words.slice(at, at + size).join(' '));
      if (meaning) return { meaning, isExact: false };
    }
  }
  return null;
}

export interface CategoryMeaning {
  /** A category of the shop, by its own name, or PURCHASE or SALE. */
  readonly category: string;
  readonly isSure: boolean;
}

/**
 * Reads category words for a shop: its own names first, then trade words that mean the same as one of them.
 * null = a word that nobody knows. `retired`: names that it no longer offers, known only when written out.
 */
export function categoryReader(
  shopCategories: readonly string[],
  retired: readonly string[] = [],
): (text: string) => CategoryMeaning | null {
  const byName = new Map([...retired, ...shopCategories].map((name) => [fold(name), name]));
  const byMeaning = new Map<string, string>();
  for (const name of shopCategories) {
    const meaning = tradeMeaning(name)?.meaning;
    if (meaning && !byMeaning.has(meaning)) byMeaning.set(meaning, name);
  }
  for (const name of shopCategories) byMeaning.set(name, name);
  return (text) => {
    const own = byName.get(fold(text));
    if (own) return { category: own, isSure: true };
    const found = tradeMeaning(text);
    if (!found) return null;
    if (found.meaning === PURCHASE || found.meaning === SALE) return { category: found.meaning, isSure: found.isExact };
    const category = byMeaning.get(found.meaning);
    return category ? { category, isSure: found.isExact } : null;
  };
}

/** Where money goes that nobody can place: the shop's own word for it, else its last category. */
export function otherCategory(shopCategories: readonly string[]): string {
  return categoryReader(shopCategories)('other')?.category ?? shopCategories.at(-1) ?? 'other';
}

/** Where work goes that somebody was paid for, as a guess. */
export function paidWorkCategory(shopCategories: readonly string[]): CategoryMeaning {
  const found = categoryReader(shopCategories)('outside labor');
  return { category: found?.category ?? otherCategory(shopCategories), isSure: false };
}
