/** What is said while something that others may also change is being written. */
export const drafts = {
  conflict: {
    title: 'Somebody else saved in the meantime',
    text: 'Nothing of yours is lost. This is what stands in the house now:',
    same: 'Nothing in these fields differs; only something else about it changed.',
    mine: 'Save mine over it',
    theirs: 'Take theirs, lose mine',
    empty: 'empty',
  },
};
