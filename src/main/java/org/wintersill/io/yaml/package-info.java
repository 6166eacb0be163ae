/**
 * <b>Purpose.</b> YAML files as values that know their line, and the checks that run files and cultivar files share.
 *
 * <p><b>May depend on.</b> {@code problem}, {@code time}; the YAML library.
 *
 * <p><b>Conventions.</b> YAML 1.2, core types only: no tags, no merge keys, no key twice, one document, limits on size, depth and
 * aliases; nothing is ever constructed but texts, lists and maps. What a text means (a number, a date, a word) is asked by whoever
 * reads it, so that the message can say what was accepted. Problems are collected, never thrown one by one. Start reading in
 * {@link org.wintersill.io.yaml.YamlReader} and {@link org.wintersill.io.yaml.YamlSection}.
 */
package org.wintersill.io.yaml;
