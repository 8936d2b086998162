// The parser behind parse_document. Own code rather than a library's because every message needs the line
// and column of a value, and duplicate keys must be refused.
#include <fmt/format.h>

#include <charconv>
#include <cmath>

#include "dropfront/problem/document.hpp"
#include "dropfront/problem/utf8.hpp"
#include "dropfront/values/input_error.hpp"
#include "dropfront/values/number_text.hpp"
#include "dropfront/values/text_file.hpp"

namespace dropfront::problem {
namespace {

constexpr int kDeepest = 64;

class Parser {
 public:
  Parser(std::string_view text, const std::string& file) : text_(text), file_(file) {}

  Node document() {
    if (text_.substr(0, 3) == "\xEF\xBB\xBF") text_.remove_prefix(3);
    if (const auto bad = values::first_invalid_utf8(text_)) {
      throw values::InputError(file_, values::line_and_column(text_, *bad),
                               "these bytes are not valid UTF-8");
    }
    skip_space();
    Node root = value(0);
    skip_space();
    if (!at_end()) fail(fmt::format("found {} after the end of the value", here()));
    return root;
  }

 private:
  bool at_end() const { return at_ >= text_.size(); }
  char peek() const { return at_end() ? '\0' : text_[at_]; }

  void advance() {
    const char c = text_[at_++];
    if (c == '\n') {
      ++place_.line;
      place_.column = 1;
    } else if ((static_cast<unsigned char>(c) & 0xC0) != 0x80) {
      ++place_.column;
    }
  }

  [[noreturn]] void fail(const std::string& message) const { fail_at(place_, message); }
  [[noreturn]] void fail_at(Place place, const std::string& message) const {
    throw values::InputError(file_, fmt::format("{}:{}", place.line, place.column), message);
  }

  std::string here() const {
    if (at_end()) return "the end of the file";
    if (static_cast<unsigned char>(peek()) < 0x20) return "the end of the line";
    return fmt::format("'{}'", text_.substr(at_, utf8_length(peek())));
  }

  void skip_space() {
    while (!at_end()) {
      const char c = peek();
      if (c == ' ' || c == '\t' || c == '\n' || c == '\r') {
        advance();
      } else if (text_.substr(at_, 2) == "//") {
        while (!at_end() && peek() != '\n') advance();
      } else if (text_.substr(at_, 2) == "/*") {
        fail("found '/*'; comments start with // and end with the line");
      } else {
        return;
      }
    }
  }

  Node value(int depth) {
    if (depth > kDeepest) fail(fmt::format("nested deeper than {} levels", kDeepest));
    Node node;
    node.place = place_;
    const char c = peek();
    if (c == '{') {
      object(node, depth);
    } else if (c == '[') {
      list(node, depth);
    } else if (c == '"') {
      node.kind = Node::Kind::text;
      node.text = text();
    } else if (c == '-' || (c >= '0' && c <= '9')) {
      number(node);
    } else {
      word(node);
    }
    return node;
  }

  void object(Node& node, int depth) {
    node.kind = Node::Kind::object;
    advance();
    skip_space();
    if (peek() == '}') return advance();
    for (;;) {
      const Place place = place_;
      if (peek() != '"') fail(fmt::format("found {}; a key in double quotes belongs here", here()));
      std::string key = text();
      for (const auto& known : node.keys) {
        if (known.name != key) continue;
        fail_at(place, fmt::format("the key \"{}\" stands twice in this object, first at {}:{}", key,
                                   known.place.line, known.place.column));
      }
      skip_space();
      if (peek() != ':') fail(fmt::format("found {} after the key \"{}\"; ':' belongs here", here(), key));
      advance();
      skip_space();
      node.keys.push_back({std::move(key), place});
      node.items.push_back(value(depth + 1));
      if (!next('}', node)) return;
      if (peek() == '}') fail("found '}' after a comma; the last entry takes no comma");
    }
  }

  void list(Node& node, int depth) {
    node.kind = Node::Kind::list;
    advance();
    skip_space();
    if (peek() == ']') return advance();
    for (;;) {
      node.items.push_back(value(depth + 1));
      if (!next(']', node)) return;
      if (peek() == ']') fail("found ']' after a comma; the last entry takes no comma");
    }
  }

  /// Behind an entry: true at a comma (skipped), false at the closing bracket (skipped).
  bool next(char close, const Node& opened) {
    skip_space();
    const char c = peek();
    if (c != ',' && c != close) {
      fail(fmt::format("found {}; ',' or '{}' belongs here, for the '{}' opened at {}:{}", here(), close,
                       close == '}' ? '{' : '[', opened.place.line, opened.place.column));
    }
    advance();
    if (c == ',') skip_space();
    return c == ',';
  }

  void word(Node& node) {
    const std::string_view rest = text_.substr(at_);
    std::size_t length = 0;
    if (rest.substr(0, 4) == "true" || rest.substr(0, 4) == "null") length = 4;
    if (rest.substr(0, 5) == "false") length = 5;
    if (length == 0) fail(fmt::format("found {}; a value belongs here (texts take double quotes)", here()));
    node.kind = rest[0] == 'n' ? Node::Kind::null : Node::Kind::boolean;
    node.boolean = rest[0] == 't';
    for (; length > 0; --length) advance();
  }

  void digits() {
    if (peek() < '0' || peek() > '9') fail(fmt::format("found {}; a digit belongs here", here()));
    while (peek() >= '0' && peek() <= '9') advance();
  }

  void number(Node& node) {
    const std::size_t begin = at_;
    if (peek() == '-') advance();
    const bool zero = peek() == '0';
    const std::size_t first = at_;
    digits();
    if (zero && at_ - first > 1) fail_at(node.place, "a number must not begin with a further 0");
    if (peek() == '.') {
      advance();
      digits();
    }
    if (peek() == 'e' || peek() == 'E') {
      advance();
      if (peek() == '+' || peek() == '-') advance();
      digits();
    }
    const std::string_view written = text_.substr(begin, at_ - begin);
    node.kind = Node::Kind::number;
    const auto [end, error] = std::from_chars(written.data(), written.data() + written.size(), node.number);
    if (error != std::errc() || end != written.data() + written.size() || !std::isfinite(node.number)) {
      fail_at(node.place, fmt::format("the number {} is out of range", written));
    }
    node.text = values::number_text(node.number);
  }

  std::string text() {
    const Place begin = place_;
    advance();
    std::string out;
    for (;;) {
      if (at_end() || peek() == '\n') fail_at(begin, "this text has no closing double quote on its line");
      const char c = peek();
      if (c == '"') break;
      if (static_cast<unsigned char>(c) < 0x20)
        fail("a control character stands in a text; write \\t or \\u");
      if (c == '\\') {
        escape(out);
        continue;
      }
      out += c;
      advance();
    }
    advance();
    return out;
  }

  void escape(std::string& out) {
    const Place begin = place_;
    advance();
    constexpr std::string_view letters = "\"\\/bfnrt";
    constexpr std::string_view meaning = "\"\\/\b\f\n\r\t";
    const auto which = at_end() ? std::string_view::npos : letters.find(peek());
    if (which != std::string_view::npos) {
      out += meaning[which];
      return advance();
    }
    if (peek() != 'u')
      fail_at(begin, "unknown escape; allowed are \\\" \\\\ \\/ \\b \\f \\n \\r \\t \\uXXXX");
    unsigned code = hex4(begin);
    if (code >= 0xD800 && code < 0xDC00 && text_.substr(at_, 2) == "\\u") {
      advance();
      const unsigned low = hex4(begin);
      if (low < 0xDC00 || low > 0xDFFF) fail_at(begin, "half of a surrogate pair");
      code = 0x10000 + ((code - 0xD800) << 10) + (low - 0xDC00);
    }
    if (code >= 0xD800 && code < 0xE000) fail_at(begin, "half of a surrogate pair");
    append_utf8(out, code);
  }

  unsigned hex4(Place begin) {
    advance();  // the u
    const std::string_view four = text_.substr(at_, 4);
    unsigned code = 0;
    const auto [end, error] = std::from_chars(four.data(), four.data() + four.size(), code, 16);
    if (four.size() != 4 || error != std::errc() || end != four.data() + 4) {
      fail_at(begin, "\\u needs four hexadecimal digits");
    }
    for (int i = 0; i < 4; ++i) advance();
    return code;
  }

  std::string_view text_;
  const std::string& file_;
  std::size_t at_ = 0;
  Place place_{1, 1};
};

}  // namespace

Node parse_document(std::string_view text, const std::string& file) { return Parser(text, file).document(); }

}  // namespace dropfront::problem
