package coldseam.cli.spoiled;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;
import java.util.regex.MatchResult;
import java.util.regex.Matcher;
import java.util.regex.Pattern;

/**
 * An SVG text spoiled by elements, attributes and numbers, and with what no drawing should hold.
 */
final class SpoiledSvg {
  private static final Pattern NUMBER = Pattern.compile("-?\\d+(\\.\\d+)?");
  private static final Pattern ATTRIBUTE = Pattern.compile("[\\w:-]+=\"([^\"<>]*)\"");
  private static final Pattern ELEMENT = Pattern.compile("<[a-zA-Z][^<>]*/>");
  private static final Pattern TAG = Pattern.compile("</?[a-zA-Z][^<>]*>");

  private static final List<String> HOSTILE =
      List.of(
          "<script>while(true){}</script>",
          "<image href=\"http://example.org/x.png\" width=\"10\" height=\"10\"/>",
          "<use href=\"http://example.org/x.svg#a\"/>",
          "<use href=\"file:///etc/passwd\"/>",
          "<use href=\"#loop\" id=\"loop\"/>",
          "<g id=\"a\"><use href=\"#b\"/></g><g id=\"b\"><use href=\"#a\"/></g>",
          "<style>@import url(\"http://example.org/x.css\"); * { fill: url(#x) }</style>",
          "<style>.a { fill: red </style>",
          "<path d=\"M0 0 L1e308 1e308 z\"/>",
          "<path d=\"M0 0 A1e-300 1e300 45 1 1 1e300 1\" stroke=\"black\" fill=\"none\"/>",
          "<path d=\"M 0 0 C\"/>",
          "<path d=\"m0,0 h100 v100 h-100 z m0,0 h100 v100 h-100 z\"/>",
          "<rect width=\"-5\" height=\"NaN\"/>",
          "<circle r=\"1e-12\"/>",
          "<circle cx=\"1e9\" cy=\"1e9\" r=\"5\" stroke=\"black\"/>",
          "<g transform=\"scale(0)\"><rect width=\"1\" height=\"1\"/></g>",
          "<g transform=\"matrix(1 2 2 4 0 0)\"><rect width=\"100\" height=\"100\"/></g>",
          "<g transform=\"rotate(1e18) skewX(90)\"><rect width=\"100\" height=\"100\"/></g>",
          "<polygon points=\"0,0 100,100 100,0 0,100\"/>",
          "<polyline points=\"0,0 1\" stroke=\"black\"/>",
          "<![CDATA[ <rect/> ]]>",
          "&e;",
          "&#0;",
          "&undefined;",
          "<?xml-stylesheet href=\"http://example.org/x.css\"?>",
          "<foreignObject><body xmlns=\"http://www.w3.org/1999/xhtml\"/></foreignObject>");

  private static final List<String> DOCTYPES =
      List.of(
          "<!DOCTYPE svg [<!ENTITY e SYSTEM \"file:///etc/passwd\">]>",
          "<!DOCTYPE svg SYSTEM \"http://example.org/x.dtd\">",
          "<!DOCTYPE svg [<!ENTITY % p SYSTEM \"http://example.org/x.dtd\"> %p;]>",
          "<!DOCTYPE svg [<!ENTITY e \"10\">]>",
          "<!DOCTYPE svg [<!ENTITY e \"&f;\"><!ENTITY f \"&e;\">]>",
          "<!DOCTYPE svg [<!ENTITY a \"aaaaaaaaaa\"><!ENTITY b \"&a;&a;&a;&a;&a;&a;&a;&a;\">"
              + "<!ENTITY c \"&b;&b;&b;&b;&b;&b;&b;&b;\"><!ENTITY d \"&c;&c;&c;&c;&c;&c;&c;&c;\">"
              + "<!ENTITY f \"&d;&d;&d;&d;&d;&d;&d;&d;\"><!ENTITY e \"&f;&f;&f;&f;&f;&f;&f;&f;\">]>");

  private final Random random;

  private SpoiledSvg(Random random) {
    this.random = random;
  }

  static String of(String text, Random random) {
    SpoiledSvg spoiled = new SpoiledSvg(random);
    String result = text;
    for (int i = random.nextInt(3) == 0 ? random.nextInt(5) : 0; i >= 0; i--) {
      result = spoiled.one(result);
    }
    return result;
  }

  private String one(String text) {
    return switch (random.nextInt(12)) {
      case 0 -> replaced(text, ELEMENT, "");
      case 1 -> twice(text);
      case 2 -> replaced(text, TAG, "");
      case 3 -> hostile(text);
      case 4 -> attribute(text, Nonsense.word(random));
      case 5 -> attribute(text, another(text));
      case 6 -> nested(text);
      default -> number(text);
    };
  }

  private MatchResult any(String text, Pattern pattern) {
    List<MatchResult> found = new ArrayList<>();
    Matcher matcher = pattern.matcher(text);
    while (matcher.find()) {
      found.add(matcher.toMatchResult());
    }
    return found.isEmpty() ? null : found.get(random.nextInt(found.size()));
  }

  private static String with(String text, int from, int to, String in) {
    return text.substring(0, from) + in + text.substring(to);
  }

  private String replaced(String text, Pattern pattern, String by) {
    MatchResult found = any(text, pattern);
    return found == null ? text : with(text, found.start(), found.end(), by);
  }

  private String number(String text) {
    MatchResult found = any(text, NUMBER);
    return found == null
        ? text
        : with(text, found.start(), found.end(), Nonsense.instead(random, found.group()));
  }

  private String attribute(String text, String value) {
    MatchResult found = any(text, ATTRIBUTE);
    String plain = value.replace("&", "&amp;").replace("<", "&lt;").replace("\"", "&quot;");
    return found == null ? text : with(text, found.start(1), found.end(1), plain);
  }

  private String another(String text) {
    MatchResult found = any(text, ATTRIBUTE);
    return found == null ? "" : found.group(1);
  }

  private String twice(String text) {
    MatchResult what = any(text, ELEMENT);
    MatchResult where = any(text, TAG);
    if (what == null) {
      return text;
    }
    String repeated = what.group().repeat(1 + random.nextInt(random.nextInt(9) == 0 ? 500 : 2));
    return with(text, where.end(), where.end(), repeated);
  }

  private String hostile(String text) {
    int root = text.indexOf("<svg");
    String in = HOSTILE.get(random.nextInt(HOSTILE.size()));
    MatchResult where = any(text, TAG);
    String spoiled = where == null ? text : with(text, where.end(), where.end(), in);
    return random.nextInt(3) == 0 && root >= 0
        ? with(spoiled, root, root, DOCTYPES.get(random.nextInt(DOCTYPES.size())))
        : spoiled;
  }

  private String nested(String text) {
    int depth = 1 + random.nextInt(random.nextInt(4) == 0 ? 5000 : 5);
    MatchResult found = any(text, ELEMENT);
    if (found == null) {
      return text;
    }
    String deep = "<g transform=\"translate(1e-9)\">".repeat(depth) + found.group();
    return with(text, found.start(), found.end(), deep + "</g>".repeat(depth));
  }
}
