package org.flexbound.report.page;

import java.util.List;
import org.flexbound.report.figures.Figure;

/** Something that stands in a section. */
public sealed interface Block {
  /**
   * A paragraph.
   *
   * @param text the text
   */
  record Text(String text) implements Block {}

  /**
   * A list.
   *
   * @param items one text each
   */
  record Bullets(List<String> items) implements Block {
    /** Copies the list. */
    public Bullets {
      items = List.copyOf(items);
    }
  }

  /**
   * Questions with their answers.
   *
   * @param answers the answers in order
   */
  record Answers(List<Answer> answers) implements Block {
    /** Copies the list. */
    public Answers {
      answers = List.copyOf(answers);
    }
  }

  /**
   * One question with its answer.
   *
   * @param question the question
   * @param answer the answer in one sentence
   * @param tone how it is to be taken
   * @param details what the answer rests on
   */
  record Answer(String question, String answer, Tone tone, List<String> details) {
    /** Copies the list. */
    public Answer {
      details = List.copyOf(details);
    }
  }

  /**
   * A table.
   *
   * @param caption what it shows
   * @param columns the columns
   * @param rows the rows, one cell for each column
   */
  record Table(String caption, List<Column> columns, List<List<Cell>> rows) implements Block {
    /** Copies the lists. */
    public Table {
      columns = List.copyOf(columns);
      rows = rows.stream().map(List::copyOf).toList();
    }
  }

  /**
   * A column of a table.
   *
   * @param heading its heading, with the unit
   * @param number whether its cells are numbers, aligned to the right
   */
  record Column(String heading, boolean number) {}

  /**
   * A cell of a table.
   *
   * @param text what stands in it
   * @param tone how it is to be taken
   */
  record Cell(String text, Tone tone) {
    /**
     * A cell without a tone.
     *
     * @param text what stands in it
     * @return the cell
     */
    public static Cell of(String text) {
      return new Cell(text, Tone.PLAIN);
    }
  }

  /**
   * Figures side by side where there is room.
   *
   * @param figures the figures
   * @param small whether several fit beside each other
   */
  record Figures(List<Figure> figures, boolean small) implements Block {
    /** Copies the list. */
    public Figures {
      figures = List.copyOf(figures);
    }
  }

  /**
   * Findings.
   *
   * @param findings the findings, worst first
   */
  record FindingList(List<Noted> findings) implements Block {
    /** Copies the list. */
    public FindingList {
      findings = List.copyOf(findings);
    }
  }

  /**
   * One finding.
   *
   * @param severity error, warning or note
   * @param tone how it is to be taken
   * @param code its code
   * @param message what was found
   * @param where its place, or empty
   * @param remedy what to do
   */
  record Noted(
      String severity, Tone tone, String code, String message, String where, String remedy) {}

  /**
   * Lines for name, date and signature.
   *
   * @param roles who signs
   */
  record Signatures(List<String> roles) implements Block {
    /** Copies the list. */
    public Signatures {
      roles = List.copyOf(roles);
    }
  }
}
