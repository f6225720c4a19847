export const usage = `ohmward COMMAND [options] FILE or FOLDER …

  check   reads and evaluates; says for each goal whether it holds and by how much
            --format text|json|sarif|junit
                                     text for people (default), JSON for programs, SARIF 2.1.0, JUnit XML
            --since FILE             compares each goal with an earlier version of the description
  solve   finds the values that are still unknown, the best first
            --format text|json
            --top N                  how many solutions (10)
            --again                  reconsiders every value that says «from» and is not «fixed»
            --write                  puts the best into the file; comments and layout stay
  sweep   the traces over frequency
            --format text|json|csv|touchstone
            --case NAME              only this load case
            --two-port               the ladder itself as a two-port (touchstone)
            -o, --output PATH        a file, or a folder where there are several
  codes   the best codes of tunable parts for each channel
            --format text|json
            --write                  writes the firmware's tables; never over a file that ohmward did not write
            --verify                 writes nothing; fails where a table is missing or out of date
  report  one self-contained HTML file with pictures and tables
            -o, --output FILE
  tidy    lays descriptions out
            --verify                 changes nothing; fails where something would change

  --help, --version

A folder means every *.match.yaml and *.match.yml under it, except in node_modules, .git and what .gitignore leaves out.
Exit code: 0 all holds; 1 a goal is missed, a description has errors or a table is out of date; 2 the call is wrong or a file in it cannot be read.
`;
