/**
 * Spelling: which valid words are most like a misspelt one; and the mark of what is undecided. The
 * entry is {@link coldseam.cases.words.Spelling}.
 */
package coldseam.cases.words;
