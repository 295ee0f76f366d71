// Where the gap of a finding comes from, in words: as everywhere else.
export { decidingRule, generalOrigin, originOf, ruleWords, sideWords } from '../../../lib/rule-words';
