// Rules of the house that no published plugin among our packages brings.
import { basename } from 'node:path';

const DISABLES = /^\s*eslint-disable(-next-line|-line)?\b/;
const REASON = /\s--\s+\S.{9,}/s;

const suppressionReason = {
  meta: {
    type: 'suggestion',
    schema: [],
    messages: {
      missing: 'A suppression says why, on the same line: "eslint-disable-next-line rule -- reason".',
    },
  },
  create: (context) => ({
    Program() {
      for (const comment of context.sourceCode.getAllComments()) {
        const isBare = DISABLES.test(comment.value) && !REASON.test(comment.value);
        if (isBare) context.report({ loc: comment.loc, messageId: 'missing' });
      }
    },
  }),
};

const KEBAB_CASE = /^\.?[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9]+(-[a-z0-9]+)*)*$/;
const NAMES_NOTHING = /^(utils?|helpers?|common|misc)\.[a-z]+$/;

const fileName = {
  meta: {
    type: 'suggestion',
    schema: [],
    messages: {
      kebab: 'Files are named in kebab-case, components too.',
      idea: 'Name the file after the idea in it; "{{name}}" could hold anything.',
    },
  },
  create: (context) => ({
    Program(node) {
      const name = basename(context.filename);
      if (!KEBAB_CASE.test(name)) context.report({ node, messageId: 'kebab' });
      if (NAMES_NOTHING.test(name)) context.report({ node, messageId: 'idea', data: { name } });
    },
  }),
};

/** ESLint plugin with the two rules. */
export const house = { rules: { 'suppression-reason': suppressionReason, 'file-name': fileName } };
