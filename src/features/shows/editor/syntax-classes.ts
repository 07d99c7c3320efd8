import { tagHighlighter, tags, type Highlighter } from "@lezer/highlight";

/** Names for the kinds of tokens; `editor.css` gives them their colours in both themes. */
export const syntaxClasses: Highlighter = tagHighlighter([
  {
    tag: [tags.keyword, tags.operatorKeyword, tags.controlKeyword, tags.definitionKeyword, tags.modifier],
    class: "syn-keyword",
  },
  { tag: [tags.string, tags.special(tags.string), tags.regexp], class: "syn-string" },
  { tag: [tags.number, tags.bool, tags.null], class: "syn-number" },
  { tag: [tags.comment], class: "syn-comment" },
  { tag: [tags.function(tags.variableName), tags.function(tags.propertyName)], class: "syn-call" },
  { tag: [tags.typeName, tags.className], class: "syn-keyword" },
  {
    tag: [tags.punctuation, tags.operator, tags.bracket, tags.separator, tags.derefOperator],
    class: "syn-punctuation",
  },
]);
