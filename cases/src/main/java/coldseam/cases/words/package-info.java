/**
 * Spelling: which valid words are most like a misspelt one. The entry is {@link
 * coldseam.cases.words.Spelling}.
 */
package coldseam.cases.words;
