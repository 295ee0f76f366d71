// Where on its stroke a motion hits or is tight: as everywhere else.
export { joinSpans, spansOf } from '../../../lib/spans';
