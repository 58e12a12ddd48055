// Read-log holds checkpoints and proofs of a witness log against the Go project's own readers,
// golang.org/x/mod/sumdb/note and sumdb/tlog. It reads a list of questions as JSON from its input
// and writes one answer each: an empty string when all is right, else what is wrong.
package main

import (
	"encoding/json"
	"fmt"
	"os"
	"strconv"
	"strings"

	"golang.org/x/mod/sumdb/note"
	"golang.org/x/mod/sumdb/tlog"
)

// A question asks one thing; which members it uses depends on Ask.
type question struct {
	Ask     string
	Vkey    string
	Note    string
	Origin  string
	Size    int64
	Root    string
	OldSize int64
	OldRoot string
	Index   int64
	Entry   []byte
	Entries [][]byte
	Proof   []string
}

func main() {
	var questions []question
	if err := json.NewDecoder(os.Stdin).Decode(&questions); err != nil {
		fmt.Fprintln(os.Stderr, err)
		os.Exit(1)
	}
	answers := []string{}
	for _, q := range questions {
		answer := ""
		if err := check(q); err != nil {
			answer = err.Error()
		}
		answers = append(answers, answer)
	}
	json.NewEncoder(os.Stdout).Encode(answers)
}

func check(q question) error {
	switch q.Ask {
	case "checkpoint":
		return checkCheckpoint(q)
	case "root":
		return checkRoot(q)
	case "inclusion":
		return checkInclusion(q)
	case "consistency":
		return checkConsistency(q)
	}
	return fmt.Errorf("nobody knows how to check %q", q.Ask)
}

// checkCheckpoint opens the note with the log's key and reads its three lines.
func checkCheckpoint(q question) error {
	verifier, err := note.NewVerifier(q.Vkey)
	if err != nil {
		return err
	}
	opened, err := note.Open([]byte(q.Note), note.VerifierList(verifier))
	if err != nil {
		return err
	}
	lines := strings.Split(opened.Text, "\n")
	want := []string{q.Origin, strconv.FormatInt(q.Size, 10), q.Root, ""}
	if strings.Join(lines, "\n") != strings.Join(want, "\n") {
		return fmt.Errorf("the text is %q", opened.Text)
	}
	return nil
}

// checkRoot builds the tree over all entries and compares its root.
func checkRoot(q question) error {
	stored := []tlog.Hash{}
	read := tlog.HashReaderFunc(func(indexes []int64) ([]tlog.Hash, error) {
		hashes := []tlog.Hash{}
		for _, index := range indexes {
			hashes = append(hashes, stored[index])
		}
		return hashes, nil
	})
	for index, entry := range q.Entries {
		hashes, err := tlog.StoredHashes(int64(index), entry, read)
		if err != nil {
			return err
		}
		stored = append(stored, hashes...)
	}
	root, err := tlog.TreeHash(int64(len(q.Entries)), read)
	if err != nil {
		return err
	}
	if root.String() != q.Root {
		return fmt.Errorf("the root is %v", root)
	}
	return nil
}

func checkInclusion(q question) error {
	hashes, root, err := parse(q.Proof, q.Root)
	if err != nil {
		return err
	}
	return tlog.CheckRecord(hashes, q.Size, root, q.Index, tlog.RecordHash(q.Entry))
}

func checkConsistency(q question) error {
	hashes, root, err := parse(q.Proof, q.Root)
	if err != nil {
		return err
	}
	oldRoot, err := tlog.ParseHash(q.OldRoot)
	if err != nil {
		return err
	}
	return tlog.CheckTree(hashes, q.Size, root, q.OldSize, oldRoot)
}

func parse(proof []string, root string) ([]tlog.Hash, tlog.Hash, error) {
	hashes := []tlog.Hash{}
	for _, text := range proof {
		hash, err := tlog.ParseHash(text)
		if err != nil {
			return nil, tlog.Hash{}, err
		}
		hashes = append(hashes, hash)
	}
	parsed, err := tlog.ParseHash(root)
	return hashes, parsed, err
}
