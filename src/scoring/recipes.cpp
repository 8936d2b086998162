#include "dropfront/scoring/recipes.hpp"

namespace dropfront::scoring {

Recipe rich_recipe(const MainsShapes& shapes) {
  Recipe recipe;
  recipe.mains = &shapes.rich;
  recipe.dropper = End::high;
  recipe.series_resistor = End::high;
  recipe.discharge = End::low;
  recipe.clamp = ZenerCurve::high;
  recipe.reservoir = End::low;
  recipe.esr = End::high;
  recipe.drops = Drops::least;
  recipe.aged = 1;
  return recipe;
}

Recipe nominal_recipe(const MainsShapes& shapes) {
  Recipe recipe;
  recipe.mains = &shapes.nominal;
  return recipe;
}

Recipe production_recipe(const MainsShapes& shapes, End series_resistor) {
  Recipe recipe;
  recipe.mains = &shapes.nominal;
  recipe.dropper = End::high;
  recipe.series_resistor = series_resistor;
  recipe.discharge = End::low;
  recipe.clamp = ZenerCurve::high;
  return recipe;
}

const char* rich_ends(bool bled) { return production_ends(End::high, bled); }

const char* production_ends(End series_resistor, bool bled) {
  if (series_resistor == End::low) {
    return bled ? "dropper high, series_resistor low, discharge low, clamp high"
                : "dropper high, series_resistor low, clamp high";
  }
  return bled ? "dropper high, series_resistor high, discharge low, clamp high"
              : "dropper high, series_resistor high, clamp high";
}

}  // namespace dropfront::scoring
