;;; test.el --- Run by test.sh in Emacs's batch mode  -*- lexical-binding: t; -*-

;; Every wait is for a state; a failure ends with exit code 1.

(require 'cl-lib)

(defvar patience (string-to-number (getenv "SETTLEWELL_WAIT")))
(defvar client (getenv "CLIENT"))

(defun check (ok what &rest values)
  (unless ok
    (message "failed: %s" (apply #'format what values))
    (kill-emacs 1)))

(defmacro wait (what condition)
  "Let the server answer until CONDITION holds.
Changes are told when Emacs is idle, which in batch mode it never is: told here instead."
  `(let ((deadline (+ (float-time) patience)))
     (while (and (not ,condition) (< (float-time) deadline))
       (when (eglot-managed-p) (eglot--signal-textDocument/didChange))
       (accept-process-output nil 0.05))
     (check ,condition "waited in vain for %s" ,what)))

(defun finding (name)
  "The finding called NAME of this sheet."
  (cl-find-if (lambda (found) (string-match-p name (flymake-diagnostic-text found)))
              (flymake-diagnostics)))

(defun go (text)
  "Put point on TEXT where it first stands."
  (goto-char (point-min))
  (check (search-forward text nil t) "no %s in the sheet" text)
  (goto-char (match-beginning 0)))

(defun stands-at (found text)
  (go text)
  (check (= (flymake-diagnostic-beg found) (point))
         "%s marked at %s" text (flymake-diagnostic-beg found)))

(defun fix (text title)
  "Pick the quick fix with TITLE at TEXT, as a person does in the minibuffer."
  (go text)
  (cl-letf ((last-nonmenu-event ?a) ; a key was pressed, not a mouse's menu
            ((symbol-function 'completing-read)
             (lambda (_prompt menu &rest _)
               (let ((chosen (cl-find-if (lambda (item) (string-match-p title (car item))) menu)))
                 (check chosen "%s is not among the fixes: %s" title (mapcar #'car menu))
                 (car chosen)))))
    (eglot-code-actions (point) (point) nil t)))

(defun says (text)
  (save-excursion (goto-char (point-min)) (search-forward text nil t)))

(setq eglot-sync-connect patience
      eglot-connect-timeout patience
      ;; A shorter timeout is of no use to a test.
      jsonrpc-default-request-timeout patience)
(load (expand-file-name "settlewell.el" client))
(setq settlewell-command (list (getenv "SETTLEWELL") "serve"))

(switch-to-buffer (find-file-noselect (getenv "SHEET")))
(check (eq major-mode 'settlewell-mode) "the mode is %s" major-mode)
;; `eglot-ensure' waits for a command to end; there is none in batch mode.
(apply #'eglot--connect (eglot--guess-contact))
(wait "the server" (eglot-managed-p))
(wait "findings" (and (finding "no supply is named") (finding "leaves")))
(check (= 2 (length (flymake-diagnostics))) "not two findings: %s"
       (mapcar #'flymake-diagnostic-text (flymake-diagnostics)))
(stands-at (finding "no supply is named") "reff")
(stands-at (finding "leaves") "8 cycles")

(go "8 cycles")
(let (text)
  (eglot-hover-eldoc-function (lambda (info &rest _) (setq text info)))
  (wait "the hover" text)
  (check (and (string-match-p "acquisition" text) (string-match-p "µs" text)) "hover says: %s" text))

;; A key of a channel, half typed.
(go "interferers: []")
(end-of-line)
(insert "\n    resol")
(completion-at-point)
(check (looking-back "^    resolution: ?" (line-beginning-position)) "completion wrote: %s"
       (buffer-substring (line-beginning-position) (line-end-position)))
(delete-region (line-end-position 0) (line-end-position))

(fix "8 cycles" "16 cycles")
(wait "the acquisition to be mended" (and (says "16 cycles") (not (finding "leaves"))))
(fix "reff" "`ref`")
(wait "the name to be mended" (and (not (says "reff")) (null (flymake-diagnostics))))
(save-buffer)
(eglot-shutdown (eglot-current-server))
;;; test.el ends here
