/** The words beside a date that say what it is the date of. */
import type { DateRole } from '../../contract/readings.ts';

/** `birth` and `other` are dates that no clock or reminder starts from. */
export type LabelRole = DateRole | 'birth' | 'other';

interface LabelGroup {
  role: LabelRole;
  /** How plainly the words name the role, 0 to 1. */
  strength: number;
  /** A small word that counts only right before the date. */
  isNear?: boolean;
  phrases: string[];
}

const groups: LabelGroup[] = [
  {
    role: 'issued',
    strength: 1,
    phrases: [
      'date of issue',
      'date of this (?:notice|letter|statement|invoice|bill|agreement|deed|report|order|will|policy|lease|certificate)',
      'date of (?:notice|invoice|letter|bill|report|statement|receipt|assessment|purchase|order|sale|payment|agreement|certificate|registration)',
      '(?:issue|issued|invoice|bill|billing|statement|notice|letter|report|receipt|order|purchase|sale|transaction|document|quote|assessment|certificate|print|claim|policy issue|pay|payment|payroll|paid|cheque|check|payslip|registration|registered|filing|filed|recording|recorded|signature|agreement|processing|preparation|mailing|delivery note) (?:date|dated|on)',
      'date (?:issued|of the issue|printed|prepared|recorded|filed|registered|signed|paid|posted|mailed|made|of the order|of the agreement|ordered|purchased|submitted|of pay|sent|reported)',
      '(?:issued|ordered|purchased|printed|prepared|filed|submitted|recorded|posted|produced|generated|paid|received by hmrc|reported|typed)(?: on| at)?',
      'date (?:typed|dictated)',
      'tax point',
      'invoice date \\(tax point\\)',
      'pay day',
      'given (?:under|at)',
      'dated(?: this| the)?',
      'made (?:on|this)',
      'this agreement is dated',
      '(?:ausstellungs|rechnungs|beleg|brief)datum',
      'ausgestellt am',
      'bescheid vom',
      "date d['’ ]?(?:émission|emission|établissement)",
      'date de délivrance',
      '[4A]a',
      'date of (?:the )?(?:grant|order|decree|decision|award|probate)',
      'dated at [a-z ]{3,25} this(?: the)?',
    ],
  },
  {
    role: 'issued',
    strength: 0.75,
    phrases: ['date', 'datum', 'as of date', 'date and time', 'date/time'],
  },
  {
    role: 'issued',
    strength: 0.7,
    phrases: [
      'signed(?: and dated)?(?: on)?',
      'registered(?: on)?',
      'signature',
      'held(?: on| at)?',
    ],
  },
  { role: 'periodStart', strength: 0.95, isNear: true, phrases: ['from', 'between', 'du', 'vom'] },
  {
    role: 'periodEnd',
    strength: 0.9,
    isNear: true,
    phrases: ['to', 'until', 'through', 'up to(?: and including)?', 'au', 'bis'],
  },
  { role: 'other', strength: 0.5, isNear: true, phrases: ['on', 'since', 'by', 'in', 'of'] },
  {
    role: 'due',
    strength: 1,
    phrases: [
      '(?:payment|balance|amount|total|minimum payment|premium|rent|full amount|first instalment|1st instalment|next payment) (?:is )?(?:now )?due(?: on| by| date)?',
      'due (?:date|on|by|before)',
      'date due',
      '(?:please )?pay (?:this )?(?:amount )?(?:by|before|on or before|no later than)',
      '(?:to be )?paid (?:by|not later than|no later than)',
      'payable (?:by|on|before)',
      'pay(?:ment)? (?:must )?(?:reach|be received by|be made by)',
      '(?:not|no) later than',
      'must reach us (?:by|before|on)',
      'on or (?:just )?(?:after|before|around|about)',
      '(?:will be )?(?:collected|taken|debited|deducted|charged) (?:by direct debit )?(?:on|from your account on)',
      'collect [^ ]+ by direct debit on',
      'settlement date',
      'settlement due',
      'deadline',
      'reply by',
      'respond by',
      'return (?:by|before)',
      'falls? due(?: on)?',
      'due',
      'next (?:check|inspection|test) due(?: before| by| on)?',
      '(?:zahlbar|fällig) (?:bis|am)(?: zum)?',
      'amount due by',
      'due and payable(?: on| by)?',
    ],
  },
  {
    role: 'periodStart',
    strength: 1,
    phrases: [
      '(?:statement|billing|bill|tax|pay|policy|rental|coverage|cover|account(?:ing)?|return|service|charge|supply) (?:period|year|cycle)(?: is| covered| beginning| starting| start| from)?',
      'period (?:of insurance|covered|of cover|of account|of tenancy|from|start|begin(?:ning|s)?|start date)',
      '(?:for the )?(?:period|quarter|year|term)(?: from| beginning| starting| commencing)?',
      '(?:start|commencement|begin|effective|inception|from) date',
      'date of commencement(?: of insurance)?',
      'effective (?:from|as of|date of commencement(?: of insurance)?)',
      'with effect from',
      'commenc(?:es|ing|ement)(?: on| date)?',
      '(?:starts?|starting|begins?|beginning)(?: on| from)?',
      'valid from',
      'cover (?:starts?|begins?|from)',
      'opening (?:balance )?(?:at|on|date)',
      'for the month of',
      'zeitraum',
    ],
  },
  {
    role: 'periodEnd',
    strength: 1,
    phrases: [
      '(?:for )?(?:the )?(?:tax |financial |income |fiscal |accounting |calendar |policy )?(?:year|period|quarter|month|week|half year|six months|twelve months|12 months|3 months)[ -]?(?:ended|ending|end|to)(?: date)?(?: on)?',
      'period (?:to|end(?:ing|s)?|end date)',
      '(?:statement|balance|closing|ending) (?:closing |closing date|as at|as of|at|on)',
      'closing (?:date|balance (?:at|on|as at))',
      'end(?:ing)? (?:date|balance on|on)',
      'end of (?:tenancy|term|period|lease)',
      'as (?:at|of)',
      'pay period end',
    ],
  },
  {
    role: 'expiry',
    strength: 1.05,
    phrases: [
      '(?:date of )?expir(?:y|ation)(?: date)?(?: of (?:insurance|cover|policy))?',
      'expir(?:es?|ing)(?: on| end of)?',
      'exp(?:\\.| date|:)',
      'date of expiry of insurance',
      'valid (?:until|to|through|thru|till)',
      'good (?:until|through|thru)',
      '(?:cover|policy|guarantee|warranty|tenancy|lease|contract|membership|subscription|insurance|agreement|fixed term|permission|permit|leave|licence|license) (?:ends?|expires?|ending|is valid until|valid until|runs? (?:to|until)|until|lasts until)(?: on)?',
      '(?:ends?|ending) (?:on|at)',
      'end of (?:cover|warranty|guarantee)',
      'renewal (?:date|due)(?: date)?',
      'renew (?:by|before)',
      '(?:use|redeem) (?:by|before)',
      '(?:offer|coupon|voucher) (?:ends|valid until|expires|valid through)',
      'gültig bis',
      'ablaufdatum',
      "date d['’ ]?expiration",
      'not valid after',
      'covered until',
      '[4A]b',
      '(?:last|final) (?:day of (?:cover|term|tenancy)|date of cover)',
      '(?:coverage|plan|protection|extended cover|registration|rego|season ticket|card|pass|visa|stay|your policy|current policy|term) (?:ends?|expires?|is valid until|valid until)(?: on)?',
      '(?:expires|ends) with the',
    ],
  },
  {
    role: 'eventDate',
    strength: 1,
    phrases: [
      'date of (?:loss|death|marriage|the marriage|incident|accident|offence|offense|violation|contravention|service|services|visit|treatment|appointment|attendance|admission|discharge|completion|transfer|gift|donation|sale|trade|settlement|test|the test|inspection|check|examination|survey|valuation|value|supply|delivery|hearing|entry|landing|registration of title|acquisition|consultation|vaccination|work|grant|probate|birth of child|conversion|award|conferral|joining)',
      '(?:loss|death|incident|accident|offence|violation|contravention|service|visit|treatment|appointment|test|inspection|completion|transfer|gift|donation|trade|closing|collection|collected|delivery|hearing|admission|discharge|effective|marriage|valuation|examination|seen|supply|acquisition|wedding|landing|installation) (?:date|on)',
      'date (?:of event|collected|received|of the marriage|died|deceased|of clinic|seen|and time of contravention|and time of offence|of admission|gift received|delivered|completed|installed|in / out|in/out|of first service|acquired)',
      '(?:when|and) (?:died|married)',
      'when and where (?:died|married|born)',
      'date and place of (?:death|marriage)',
      '(?:died|married|seen|admitted|discharged|delivered|installed|completed|vaccinated|inspected|tested|hearing)(?: on| at)?',
      'clinic date',
      'in clinic on',
      '(?:you|he|she|they) (?:attended|visited)(?: us)?(?: on)?',
      '(?:on the|date of) (?:contract|contravention)',
      '(?:employment|your employment|job|position|work|you) (?:will )?(?:start|begin|commence)s?(?: with us)?(?: on)?',
      '(?:first day|start date|commencement date|joining date|date of commencement|commencement of employment|date of hire|hire date|employment (?:start|began|commenced))(?: of (?:work|employment))?(?: on| is| will be)?',
      'paid (?:in full|off|out) (?:on|as of)',
      'trade date(?: and time)?',
      '(?:acquired|acquisition)(?: of)?(?: vehicle)?(?: on| date)?',
      'work (?:carried out|completed|done)(?: on| between)?',
    ],
  },
  {
    role: 'birth',
    strength: 1.1,
    phrases: [
      'date of birth',
      'birth ?date',
      'd\\.?o\\.?b\\.?',
      'born(?: on)?',
      'date and place of birth',
      'when (?:and where )?born',
      'birth',
      'geburtsdatum',
      'geboren(?: am)?',
      'né(?:e)? le',
      'date de naissance',
      'aged?',
    ],
  },
  {
    role: 'other',
    strength: 1.1,
    phrases: [
      'next (?:statement|bill|payment|meter reading|reading|review|appointment|service|visit|issue|payslip|oil change(?: due)?)(?: date| on| due| is)*',
      '(?:last|previous|prior|your last) (?:statement|bill|payment|invoice|service|reading|review|test|test date|visit|seen|issued|balance)(?: date| on)?',
      '(?:appointment|commission) expires',
      '(?:member|customer|client|account holder) since',
      'joined',
      'original (?:[a-z]+ ){0,2}date',
      'matures?(?: on)?',
      'marriage of parents',
      'since',
      'rev(?:\\.|ised|ision)?',
      'version',
      'printed in',
      'payment received(?:,? thank you)?',
      'date joined(?: scheme)?',
      'retirement (?:date|age)',
      'normal retirement(?: date)?',
      'established',
      'founded',
      'review due(?: by)?',
      'date first registered',
      'first registered',
      'date of first registration',
      'account opened',
      'tariff ends(?: on)?',
      'minimum term ends(?: on)?',
      'manufactured',
      'act',
      'regulations',
    ],
  },
];

const edge = '(?<![a-zà-ÿ0-9])';
const compiled = groups.map((group) => ({
  role: group.role,
  strength: group.strength,
  isNear: group.isNear ?? false,
  pattern: new RegExp(
    `${edge}(?:${[...group.phrases].sort((a, b) => b.length - a.length).join('|')})(?![a-zà-ÿ0-9])`,
    'gi',
  ),
}));

export interface DateLabel {
  role: LabelRole;
  strength: number;
  isNear: boolean;
  start: number;
  end: number;
}

/** The date labels of a line; where two overlap the longer one stays. */
export function findDateLabels(text: string): DateLabel[] {
  const labels: DateLabel[] = [];
  for (const { role, strength, isNear, pattern } of compiled) {
    for (const match of text.matchAll(pattern)) {
      labels.push({
        role,
        strength,
        isNear,
        start: match.index,
        end: match.index + match[0].length,
      });
    }
  }
  labels.sort((a, b) => b.end - b.start - (a.end - a.start) || b.strength - a.strength);
  const kept: DateLabel[] = [];
  for (const label of labels) {
    if (!kept.some((other) => other.start < label.end && other.end > label.start)) kept.push(label);
  }
  return kept.sort((a, b) => a.start - b.start);
}
