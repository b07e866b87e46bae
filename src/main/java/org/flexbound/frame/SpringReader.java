package org.flexbound.frame;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.EnumMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.EigenDecomposition_F64;
import org.flexbound.document.Json;

/** Reads the stiffnesses and the factors of joints, connections, supports, members and materials. */
final class SpringReader {
  /** The words for no motion and for no resistance. */
  static final String RIGID = "rigid";

  static final String FIXED = "fixed";
  static final String FREE = "free";

  private final Entries entries;

  SpringReader(Entries entries) {
    this.entries = entries;
  }

  static List<String> keys() {
    return Arrays.stream(Spring.values()).map(Spring::key).toList();
  }

  /** Six components; those not stated are as given. */
  SpringSet components(Json.Members owner, String word, Stiffness notStated) {
    List<Stiffness> six = new ArrayList<>();
    for (Spring spring : Spring.values()) {
      Json value = owner.members().get(spring.key());
      six.add(
          value == null || value instanceof Json.Nothing
              ? notStated
              : stiffness(value, Measure.of(spring), word).orElse(notStated));
    }
    return SpringSet.of(six);
  }

  private Optional<Stiffness> stiffness(Json value, Measure measure, String word) {
    if (value instanceof Json.Text text) {
      String lower = text.text().strip().toLowerCase(Locale.ROOT);
      if (lower.equals(word)) {
        return Optional.of(Stiffness.RIGID);
      }
      if (lower.equals(FREE)) {
        return Optional.of(Stiffness.FREE);
      }
      if (lower.isEmpty() || "+-.0123456789".indexOf(lower.charAt(0)) < 0) {
        entries.wrong(
            value, measure.words() + ", \"" + word + "\" or \"" + FREE + "\"");
        return Optional.empty();
      }
    }
    OptionalDouble number = entries.number(value, measure);
    if (number.isEmpty()) {
      return Optional.empty();
    }
    if (number.getAsDouble() < 0) {
      entries.add(
          FrameFinding.OUT_OF_RANGE,
          value.where(),
          "found " + value.shown() + "; a stiffness is not negative");
      return Optional.empty();
    }
    return Optional.of(new Stiffness(number.getAsDouble()));
  }

  /** A full symmetric matrix without a negative direction. */
  Optional<SpringSet> matrix(Json value) {
    double[][] matrix = new double[6][6];
    if (!(value instanceof Json.Items rows) || rows.items().size() != 6) {
      entries.wrong(value, "six rows of six stiffnesses");
      return Optional.empty();
    }
    for (int row = 0; row < 6; row++) {
      if (!(rows.items().get(row) instanceof Json.Items line) || line.items().size() != 6) {
        entries.wrong(rows.items().get(row), "a row of six stiffnesses");
        return Optional.empty();
      }
      for (int column = 0; column < 6; column++) {
        Measure measure =
            row < 3 && column < 3
                ? Measure.STIFFNESS
                : row >= 3 && column >= 3 ? Measure.ROTATIONAL_STIFFNESS : Measure.COUPLING;
        OptionalDouble number = entries.number(line.items().get(column), measure);
        if (number.isEmpty()) {
          return Optional.empty();
        }
        matrix[row][column] = number.getAsDouble();
      }
    }
    return symmetric(value, matrix);
  }

  private Optional<SpringSet> symmetric(Json value, double[][] matrix) {
    double[] scale = new double[6];
    for (int i = 0; i < 6; i++) {
      scale[i] = matrix[i][i] > 0 ? 1 / Math.sqrt(matrix[i][i]) : 1;
    }
    DMatrixRMaj scaled = new DMatrixRMaj(6, 6);
    for (int i = 0; i < 6; i++) {
      for (int j = 0; j < 6; j++) {
        scaled.set(i, j, (matrix[i][j] + matrix[j][i]) / 2 * scale[i] * scale[j]);
        if (Math.abs(matrix[i][j] - matrix[j][i]) * scale[i] * scale[j] > 1e-6) {
          entries.add(
              FrameFinding.OUT_OF_RANGE,
              value.where(),
              "the matrix is not symmetric in row " + (i + 1) + ", column " + (j + 1));
          return Optional.empty();
        }
      }
    }
    EigenDecomposition_F64<DMatrixRMaj> eigen = DecompositionFactory_DDRM.eig(6, false, true);
    if (!eigen.decompose(scaled)) {
      entries.wrong(value, "a matrix of finite numbers");
      return Optional.empty();
    }
    for (int i = 0; i < 6; i++) {
      if (eigen.getEigenvalue(i).getReal() < -1e-9) {
        entries.add(
            FrameFinding.OUT_OF_RANGE,
            value.where(),
            "the matrix has a direction in which it pushes instead of resisting (it is not"
                + " positive semidefinite)");
        return Optional.empty();
      }
    }
    double[][] exact = new double[6][6];
    for (int i = 0; i < 6; i++) {
      for (int j = 0; j < 6; j++) {
        exact[i][j] = i == j ? matrix[i][i] : (matrix[i][j] + matrix[j][i]) / 2;
      }
    }
    return Optional.of(SpringSet.of(exact));
  }

  Map<Spring, StiffnessSetting> springFactors(Json.Members owner, String ownerName, String word) {
    Map<Spring, StiffnessSetting> result = new EnumMap<>(Spring.class);
    entries
        .members(owner, "factors")
        .ifPresent(
            factors -> {
              entries.refuseOtherKeys(factors, "the factors of " + ownerName, keys());
              for (Spring spring : Spring.values()) {
                factors
                    .get(spring.key())
                    .flatMap(value -> setting(value, Measure.of(spring), word))
                    .ifPresent(setting -> result.put(spring, setting));
              }
            });
    return result;
  }

  Map<Rigidity, StiffnessSetting> memberFactors(Json.Members owner, String ownerName) {
    Map<Rigidity, StiffnessSetting> result = new EnumMap<>(Rigidity.class);
    entries
        .members(owner, "factors")
        .ifPresent(
            factors -> {
              entries.refuseOtherKeys(
                  factors,
                  "the factors of " + ownerName,
                  Arrays.stream(Rigidity.values()).map(Rigidity::key).toList());
              for (Rigidity rigidity : Rigidity.values()) {
                factors
                    .get(rigidity.key())
                    .flatMap(value -> setting(value, Measure.of(rigidity), RIGID))
                    .filter(setting -> refuseFree(setting, factors, rigidity))
                    .ifPresent(setting -> result.put(rigidity, setting));
              }
            });
    return result;
  }

  private boolean refuseFree(StiffnessSetting setting, Json.Members factors, Rigidity rigidity) {
    boolean free = setting instanceof StiffnessSetting.Value value && value.stiffness() == 0;
    if (free) {
      entries.add(
          FrameFinding.OUT_OF_RANGE,
          factors.members().getOrDefault(rigidity.key(), factors).where(),
          "a member's stiffness cannot be 0");
    }
    return !free;
  }

  StiffnessSetting materialFactor(Json.Members owner, String ownerName) {
    Optional<Json.Members> factors = entries.members(owner, "factors");
    if (factors.isEmpty()) {
      return StiffnessSetting.nominal();
    }
    entries.refuseOtherKeys(factors.get(), "the factors of " + ownerName, List.of("E"));
    return factors
        .get()
        .get("E")
        .flatMap(value -> setting(value, Measure.STRESS, RIGID))
        .filter(
            setting ->
                setting instanceof StiffnessSetting.Factor
                    || (setting instanceof StiffnessSetting.Value value
                        && value.stiffness() > 0
                        && Double.isFinite(value.stiffness())))
        .orElse(StiffnessSetting.nominal());
  }

  /** A number is a multiple of the nominal stiffness, a text the stiffness in its place. */
  private Optional<StiffnessSetting> setting(Json value, Measure measure, String word) {
    if (value instanceof Json.Numeral number) {
      if (number.value() > 0) {
        return Optional.of(new StiffnessSetting.Factor(number.value()));
      }
      entries.add(
          FrameFinding.OUT_OF_RANGE,
          value.where(),
          "found " + value.shown() + "; a factor is more than 0");
      return Optional.empty();
    }
    return stiffness(value, measure, word)
        .map(stiffness -> new StiffnessSetting.Value(stiffness.value()));
  }
}
