#include "dropfront/problem/document.hpp"

#include <fmt/format.h>

#include <utility>

namespace dropfront::problem {
namespace {

void append_text(std::string& out, std::string_view text) {
  out += '"';
  for (const char c : text) {
    switch (c) {
      case '"':
        out += "\\\"";
        break;
      case '\\':
        out += "\\\\";
        break;
      case '\n':
        out += "\\n";
        break;
      case '\t':
        out += "\\t";
        break;
      default:
        if (static_cast<unsigned char>(c) < 0x20) {
          out += fmt::format("\\u{:04x}", static_cast<unsigned>(c));
        } else {
          out += c;
        }
    }
  }
  out += '"';
}

void append(std::string& out, const Node& node) {
  switch (node.kind) {
    case Node::Kind::null:
      out += "null";
      return;
    case Node::Kind::boolean:
      out += node.boolean ? "true" : "false";
      return;
    case Node::Kind::number:
      out += node.text;
      return;
    case Node::Kind::text:
      append_text(out, node.text);
      return;
    case Node::Kind::list:
    case Node::Kind::object:
      break;
  }
  const bool object = node.kind == Node::Kind::object;
  out += object ? '{' : '[';
  for (std::size_t i = 0; i < node.items.size(); ++i) {
    if (i > 0) out += ',';
    if (object) {
      append_text(out, node.keys[i].name);
      out += ':';
    }
    append(out, node.items[i]);
  }
  out += object ? '}' : ']';
}

}  // namespace

const Node* Node::find(std::string_view key) const {
  for (std::size_t i = 0; i < keys.size(); ++i) {
    if (keys[i].name == key) return &items[i];
  }
  return nullptr;
}

Node* Node::find(std::string_view key) { return const_cast<Node*>(std::as_const(*this).find(key)); }

Node text_node(std::string text, Place place) {
  Node node;
  node.kind = Node::Kind::text;
  node.place = place;
  node.text = std::move(text);
  return node;
}

std::string canonical_json(const Node& node) {
  std::string out;
  append(out, node);
  return out;
}

}  // namespace dropfront::problem
